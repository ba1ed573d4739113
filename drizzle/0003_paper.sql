CREATE TABLE `comment` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`camp_id` text,
	`shelter_id` text,
	`user_id` text,
	`user_name` text NOT NULL,
	`body` text NOT NULL,
	`mentions` text DEFAULT '[]' NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`camp_id`) REFERENCES `camp`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`shelter_id`) REFERENCES `shelter`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE set null,
	CONSTRAINT "comment_subject" CHECK(("comment"."camp_id" is null) <> ("comment"."shelter_id" is null))
);
--> statement-breakpoint
CREATE INDEX `comment_camp` ON `comment` (`camp_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `comment_shelter` ON `comment` (`shelter_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `comment_trip` ON `comment` (`trip_id`,`created_at`);--> statement-breakpoint
CREATE TABLE `paper_copy` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`person_id` text NOT NULL,
	`way` text NOT NULL,
	`version` integer NOT NULL,
	`content` text NOT NULL,
	`user_name` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `paper_copy_person` ON `paper_copy` (`person_id`,`created_at`);--> statement-breakpoint
CREATE UNIQUE INDEX `paper_copy_once` ON `paper_copy` (`person_id`,`way`,`version`);--> statement-breakpoint
CREATE TABLE `paper_look` (
	`person_id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`version` integer NOT NULL,
	`content` text NOT NULL,
	`seen_at` integer NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
