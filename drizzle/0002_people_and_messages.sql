CREATE TABLE `answer` (
	`person_id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`value` text NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`is_waiting` integer DEFAULT false NOT NULL,
	`answered_at` integer NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `answer_trip` ON `answer` (`trip_id`,`answered_at`);--> statement-breakpoint
CREATE TABLE `emergency_plan` (
	`trip_id` text PRIMARY KEY NOT NULL,
	`meeting_points` text DEFAULT '' NOT NULL,
	`way_out` text DEFAULT '' NOT NULL,
	`group_phone` text DEFAULT '' NOT NULL,
	`due_back_at` integer,
	`outside_name` text DEFAULT '' NOT NULL,
	`outside_email` text DEFAULT '' NOT NULL,
	`outside_phone` text DEFAULT '' NOT NULL,
	`steps` text DEFAULT '[]' NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`sent_version` integer,
	`sent_at` integer,
	`back_at` integer,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `notice` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`person_id` text NOT NULL,
	`sentence` text NOT NULL,
	`created_at` integer NOT NULL,
	`sent_at` integer,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `notice_open` ON `notice` (`sent_at`,`created_at`);--> statement-breakpoint
CREATE INDEX `notice_person` ON `notice` (`person_id`);--> statement-breakpoint
CREATE TABLE `personal_detail` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`person_id` text NOT NULL,
	`sealed` text NOT NULL,
	`consent_text` text NOT NULL,
	`consent_at` integer NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `personal_detail_person` ON `personal_detail` (`person_id`);--> statement-breakpoint
CREATE INDEX `personal_detail_trip` ON `personal_detail` (`trip_id`);--> statement-breakpoint
CREATE TABLE `roster` (
	`trip_id` text PRIMARY KEY NOT NULL,
	`capacity` integer,
	`answer_by` text,
	`remind_days_before` integer,
	`keep_details_days` integer NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `message_template` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`name` text NOT NULL,
	`subject` text NOT NULL,
	`body` text NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `message_template_trip` ON `message_template` (`trip_id`);--> statement-breakpoint
CREATE TABLE `planned_send` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`by_user_id` text NOT NULL,
	`content` text NOT NULL,
	`send_at` integer NOT NULL,
	`state` text DEFAULT 'planned' NOT NULL,
	`reason` text,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`by_user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `planned_send_due` ON `planned_send` (`state`,`send_at`);--> statement-breakpoint
CREATE INDEX `planned_send_trip` ON `planned_send` (`trip_id`);--> statement-breakpoint
CREATE TABLE `sent_paper` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`person_id` text NOT NULL,
	`message_id` text NOT NULL,
	`paper_key` text NOT NULL,
	`label` text NOT NULL,
	`fingerprint` text NOT NULL,
	`sent_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`message_id`) REFERENCES `outbox_message`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `sent_paper_person` ON `sent_paper` (`trip_id`,`person_id`);--> statement-breakpoint
CREATE TABLE `trip_calendar` (
	`trip_id` text PRIMARY KEY NOT NULL,
	`uid` text NOT NULL,
	`sequence` integer DEFAULT 0 NOT NULL,
	`fingerprint` text NOT NULL,
	`called_off_at` integer,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
ALTER TABLE `outbox_message` ADD `read_at` integer;