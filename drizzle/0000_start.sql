CREATE TABLE `account` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`account_id` text NOT NULL,
	`provider_id` text NOT NULL,
	`access_token` text,
	`refresh_token` text,
	`id_token` text,
	`access_token_expires_at` integer,
	`refresh_token_expires_at` integer,
	`scope` text,
	`password` text,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `account_user` ON `account` (`user_id`);--> statement-breakpoint
CREATE TABLE `rate_limit` (
	`id` text PRIMARY KEY NOT NULL,
	`key` text NOT NULL,
	`count` integer NOT NULL,
	`last_request` integer NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `rate_limit_key_unique` ON `rate_limit` (`key`);--> statement-breakpoint
CREATE TABLE `session` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`token` text NOT NULL,
	`expires_at` integer NOT NULL,
	`ip_address` text,
	`user_agent` text,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `session_token_unique` ON `session` (`token`);--> statement-breakpoint
CREATE INDEX `session_user` ON `session` (`user_id`);--> statement-breakpoint
CREATE TABLE `user` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`email` text NOT NULL,
	`email_verified` integer DEFAULT false NOT NULL,
	`image` text,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `user_email_unique` ON `user` (`email`);--> statement-breakpoint
CREATE TABLE `verification` (
	`id` text PRIMARY KEY NOT NULL,
	`identifier` text NOT NULL,
	`value` text NOT NULL,
	`expires_at` integer NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `verification_identifier` ON `verification` (`identifier`);--> statement-breakpoint
CREATE TABLE `camp` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`position` integer NOT NULL,
	`name` text NOT NULL,
	`nights` integer DEFAULT 1 NOT NULL,
	`latitude` real,
	`longitude` real,
	`altitude_m` real,
	`ground` text,
	`second_ground` text,
	`slope_deg` real DEFAULT 0 NOT NULL,
	`exposure` text,
	`hill` text,
	`windbreak` text,
	`under_trees_speed_ratio` real,
	`temperature_c` real,
	`wind` text,
	`wind_from_deg` real,
	`wind_to_deg` real,
	`strong_wind_hours` real,
	`has_rocks` integer DEFAULT false NOT NULL,
	`has_trees` integer DEFAULT false NOT NULL,
	`has_sticks` integer DEFAULT false NOT NULL,
	`water` text DEFAULT '' NOT NULL,
	`notes` text DEFAULT '' NOT NULL,
	`hazards` text DEFAULT '[]' NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `camp_trip` ON `camp` (`trip_id`,`position`);--> statement-breakpoint
CREATE TABLE `change_log` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`user_id` text,
	`user_name` text NOT NULL,
	`action` text NOT NULL,
	`entity` text NOT NULL,
	`entity_id` text NOT NULL,
	`summary` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE set null
);
--> statement-breakpoint
CREATE INDEX `change_log_trip` ON `change_log` (`trip_id`,`created_at`);--> statement-breakpoint
CREATE TABLE `invitation` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`person_id` text NOT NULL,
	`token_hash` text NOT NULL,
	`expires_at` integer NOT NULL,
	`used_at` integer,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `invitation_token_hash_unique` ON `invitation` (`token_hash`);--> statement-breakpoint
CREATE INDEX `invitation_person` ON `invitation` (`person_id`);--> statement-breakpoint
CREATE TABLE `person` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`user_id` text,
	`name` text NOT NULL,
	`email` text NOT NULL,
	`role` text NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE set null
);
--> statement-breakpoint
CREATE UNIQUE INDEX `person_trip_email` ON `person` (`trip_id`,`email`);--> statement-breakpoint
CREATE UNIQUE INDEX `person_trip_user` ON `person` (`trip_id`,`user_id`) WHERE user_id is not null;--> statement-breakpoint
CREATE INDEX `person_user` ON `person` (`user_id`);--> statement-breakpoint
CREATE TABLE `trip` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`start_date` text NOT NULL,
	`time_zone` text NOT NULL,
	`notes` text DEFAULT '' NOT NULL,
	`contacts` text DEFAULT '[]' NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`paper_version` integer DEFAULT 1 NOT NULL,
	`created_by` text,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`created_by`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE set null
);
--> statement-breakpoint
CREATE TABLE `carry` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`person_id` text NOT NULL,
	`shelter_id` text,
	`kit_item_id` text,
	`count` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`shelter_id`) REFERENCES `shelter`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`kit_item_id`) REFERENCES `kit_item`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `carry_trip` ON `carry` (`trip_id`);--> statement-breakpoint
CREATE TABLE `gear` (
	`id` text PRIMARY KEY NOT NULL,
	`owner_id` text NOT NULL,
	`details` text NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`owner_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `gear_owner` ON `gear` (`owner_id`);--> statement-breakpoint
CREATE TABLE `kit_item` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`position` integer NOT NULL,
	`details` text NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `kit_item_trip` ON `kit_item` (`trip_id`,`position`);--> statement-breakpoint
CREATE TABLE `pack_item` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`person_id` text,
	`position` integer NOT NULL,
	`name` text NOT NULL,
	`is_group_thing` integer DEFAULT false NOT NULL,
	`mass_kg` real,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `pack_item_trip` ON `pack_item` (`trip_id`);--> statement-breakpoint
CREATE TABLE `pack_tick` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`person_id` text NOT NULL,
	`item_key` text NOT NULL,
	`ticked_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `pack_tick_person_item` ON `pack_tick` (`person_id`,`item_key`);--> statement-breakpoint
CREATE INDEX `pack_tick_trip` ON `pack_tick` (`trip_id`);--> statement-breakpoint
CREATE TABLE `pitch` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`camp_id` text NOT NULL,
	`shelter_id` text NOT NULL,
	`position` integer NOT NULL,
	`heading_deg` real NOT NULL,
	`patch` text NOT NULL,
	`dimensions` text NOT NULL,
	`line_lengths_m` text NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`camp_id`) REFERENCES `camp`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`shelter_id`) REFERENCES `shelter`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `pitch_camp_shelter` ON `pitch` (`camp_id`,`shelter_id`);--> statement-breakpoint
CREATE INDEX `pitch_trip` ON `pitch` (`trip_id`);--> statement-breakpoint
CREATE TABLE `shelter` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`position` integer NOT NULL,
	`name` text NOT NULL,
	`sleeps` integer NOT NULL,
	`mass_kg` real,
	`spec` text NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `shelter_trip` ON `shelter` (`trip_id`,`position`);--> statement-breakpoint
CREATE TABLE `sleeper` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`camp_id` text NOT NULL,
	`person_id` text NOT NULL,
	`pitch_id` text,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`camp_id`) REFERENCES `camp`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`pitch_id`) REFERENCES `pitch`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `sleeper_camp_person` ON `sleeper` (`camp_id`,`person_id`);--> statement-breakpoint
CREATE INDEX `sleeper_trip` ON `sleeper` (`trip_id`);--> statement-breakpoint
CREATE TABLE `analysis_cache` (
	`key` text PRIMARY KEY NOT NULL,
	`analysis` text NOT NULL,
	`used_at` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `analysis_cache_used` ON `analysis_cache` (`used_at`);--> statement-breakpoint
CREATE TABLE `placement` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`camp_id` text NOT NULL,
	`pitch_id` text NOT NULL,
	`tie_out_id` text NOT NULL,
	`anchor_id` text NOT NULL,
	`lean_deg` real NOT NULL,
	`depth_out_m` real DEFAULT 0 NOT NULL,
	`tandem` text,
	`rock_kg` real DEFAULT 0 NOT NULL,
	`has_shock_cord` integer DEFAULT false NOT NULL,
	`knot` text NOT NULL,
	`is_pinned` integer DEFAULT false NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`camp_id`) REFERENCES `camp`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`pitch_id`) REFERENCES `pitch`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `placement_spot` ON `placement` (`pitch_id`,`tie_out_id`);--> statement-breakpoint
CREATE INDEX `placement_camp` ON `placement` (`camp_id`);--> statement-breakpoint
CREATE INDEX `placement_anchor` ON `placement` (`trip_id`,`anchor_id`);--> statement-breakpoint
CREATE TABLE `plan_intent` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`camp_id` text NOT NULL,
	`user_id` text,
	`user_name` text NOT NULL,
	`base_version` integer NOT NULL,
	`result_version` integer NOT NULL,
	`change` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`camp_id`) REFERENCES `camp`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE set null
);
--> statement-breakpoint
CREATE INDEX `plan_intent_camp` ON `plan_intent` (`camp_id`,`result_version`);--> statement-breakpoint
CREATE TABLE `staking_plan` (
	`camp_id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`version` integer DEFAULT 0 NOT NULL,
	`updated_by` text,
	`updated_by_name` text DEFAULT '' NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`camp_id`) REFERENCES `camp`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`updated_by`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE set null
);
--> statement-breakpoint
CREATE INDEX `staking_plan_trip` ON `staking_plan` (`trip_id`);--> statement-breakpoint
CREATE TABLE `captured_mail` (
	`id` text PRIMARY KEY NOT NULL,
	`to_address` text NOT NULL,
	`subject` text NOT NULL,
	`raw` blob NOT NULL,
	`received_at` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `captured_mail_received` ON `captured_mail` (`received_at`);--> statement-breakpoint
CREATE TABLE `outbox_attachment` (
	`id` text PRIMARY KEY NOT NULL,
	`message_id` text NOT NULL,
	`file_id` text NOT NULL,
	`file_name` text NOT NULL,
	`content_type` text NOT NULL,
	`position` integer NOT NULL,
	FOREIGN KEY (`message_id`) REFERENCES `outbox_message`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`file_id`) REFERENCES `outbox_file`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `outbox_attachment_message` ON `outbox_attachment` (`message_id`);--> statement-breakpoint
CREATE TABLE `outbox_file` (
	`id` text PRIMARY KEY NOT NULL,
	`content` blob NOT NULL,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE `outbox_message` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text,
	`person_id` text,
	`kind` text NOT NULL,
	`request_id` text NOT NULL,
	`to_name` text NOT NULL,
	`to_address` text NOT NULL,
	`reply_to_name` text,
	`reply_to_address` text,
	`subject` text NOT NULL,
	`text` text NOT NULL,
	`html` text NOT NULL,
	`message_id` text NOT NULL,
	`state` text DEFAULT 'waiting' NOT NULL,
	`attempts` integer DEFAULT 0 NOT NULL,
	`next_attempt_at` integer NOT NULL,
	`lease_until` integer,
	`last_error` text,
	`created_at` integer NOT NULL,
	`sent_at` integer,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE set null
);
--> statement-breakpoint
CREATE UNIQUE INDEX `outbox_message_message_id_unique` ON `outbox_message` (`message_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `outbox_request_address` ON `outbox_message` (`request_id`,`to_address`);--> statement-breakpoint
CREATE INDEX `outbox_due` ON `outbox_message` (`state`,`next_attempt_at`);--> statement-breakpoint
CREATE INDEX `outbox_trip` ON `outbox_message` (`trip_id`,`created_at`);--> statement-breakpoint
CREATE TABLE `preference` (
	`user_id` text PRIMARY KEY NOT NULL,
	`preferences` text NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `request_quota` (
	`id` text PRIMARY KEY NOT NULL,
	`key` text NOT NULL,
	`window_start` integer NOT NULL,
	`count` integer NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `request_quota_key_unique` ON `request_quota` (`key`);