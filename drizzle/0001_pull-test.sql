CREATE TABLE `learning_choice` (
	`camp_id` text NOT NULL,
	`trip_id` text NOT NULL,
	`patch` text NOT NULL,
	`uses_elsewhere` integer NOT NULL,
	PRIMARY KEY(`camp_id`, `patch`),
	FOREIGN KEY (`camp_id`) REFERENCES `camp`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `learning_choice_trip` ON `learning_choice` (`trip_id`);--> statement-breakpoint
CREATE TABLE `pull_photo` (
	`id` text PRIMARY KEY NOT NULL,
	`pull_test_id` text NOT NULL,
	`content_type` text NOT NULL,
	`content` blob NOT NULL,
	`byte_count` integer NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`pull_test_id`) REFERENCES `pull_test`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `pull_photo_pull_test_id_unique` ON `pull_photo` (`pull_test_id`);--> statement-breakpoint
CREATE TABLE `pull_test` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text,
	`camp_id` text,
	`patch` text,
	`owner_id` text,
	`place` text DEFAULT '' NOT NULL,
	`anchor_name` text NOT NULL,
	`anchor` text NOT NULL,
	`ground` text NOT NULL,
	`lean_deg` real NOT NULL,
	`line_angle_deg` real NOT NULL,
	`depth_out_m` real NOT NULL,
	`force` real NOT NULL,
	`force_unit` text NOT NULL,
	`outcome` text NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`is_off` integer DEFAULT false NOT NULL,
	`pulled_at` integer NOT NULL,
	`logged_by` text,
	`logged_by_name` text NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`camp_id`) REFERENCES `camp`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`owner_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`logged_by`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE set null,
	CONSTRAINT "pull_test_somewhere" CHECK(("pull_test"."camp_id" is null) <> ("pull_test"."owner_id" is null))
);
--> statement-breakpoint
CREATE INDEX `pull_test_camp` ON `pull_test` (`camp_id`,`pulled_at`);--> statement-breakpoint
CREATE INDEX `pull_test_trip` ON `pull_test` (`trip_id`,`camp_id`);--> statement-breakpoint
CREATE INDEX `pull_test_owner` ON `pull_test` (`owner_id`,`pulled_at`);--> statement-breakpoint
CREATE INDEX `pull_test_logger` ON `pull_test` (`logged_by`);