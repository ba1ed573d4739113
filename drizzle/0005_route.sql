CREATE TABLE `camp_stop` (
	`camp_id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`at_m` real,
	`leg` text,
	FOREIGN KEY (`camp_id`) REFERENCES `camp`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `camp_stop_trip` ON `camp_stop` (`trip_id`);--> statement-breakpoint
CREATE TABLE `route_line` (
	`trip_id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`source` text NOT NULL,
	`points` blob NOT NULL,
	`point_count` integer NOT NULL,
	`starts` text NOT NULL,
	`length_m` real NOT NULL,
	`breaks` text NOT NULL,
	`simplified` text NOT NULL,
	`profile` text NOT NULL,
	`places` text NOT NULL,
	`remarks` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `route_settings` (
	`trip_id` text PRIMARY KEY NOT NULL,
	`settings` text NOT NULL,
	`home_leg` text,
	`version` integer DEFAULT 1 NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
