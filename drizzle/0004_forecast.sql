CREATE TABLE `accepted_forecast` (
	`camp_id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`forecast_id` text NOT NULL,
	`content` text NOT NULL,
	`accepted_by_name` text NOT NULL,
	`accepted_at` integer NOT NULL,
	FOREIGN KEY (`camp_id`) REFERENCES `camp`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `accepted_forecast_trip` ON `accepted_forecast` (`trip_id`);--> statement-breakpoint
CREATE TABLE `forecast` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`camp_id` text NOT NULL,
	`content` text NOT NULL,
	`fetched_by_name` text NOT NULL,
	`fetched_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`camp_id`) REFERENCES `camp`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `forecast_camp` ON `forecast` (`camp_id`,`fetched_at`);--> statement-breakpoint
CREATE INDEX `forecast_trip` ON `forecast` (`trip_id`);--> statement-breakpoint
CREATE TABLE `forecast_failure` (
	`camp_id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`reason` text NOT NULL,
	`count` integer DEFAULT 1 NOT NULL,
	`failed_at` integer NOT NULL,
	FOREIGN KEY (`camp_id`) REFERENCES `camp`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `forecast_failure_trip` ON `forecast_failure` (`trip_id`);--> statement-breakpoint
ALTER TABLE `camp` ADD `alternative_to_id` text REFERENCES camp(id) ON DELETE cascade;--> statement-breakpoint
ALTER TABLE `camp` ADD `water_distance_m` real;--> statement-breakpoint
ALTER TABLE `camp` ADD `way_out` text DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE `camp` ADD `meeting_point` text DEFAULT '' NOT NULL;--> statement-breakpoint
CREATE INDEX `camp_alternative` ON `camp` (`alternative_to_id`);