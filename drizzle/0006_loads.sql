CREATE TABLE `group_thing` (
	`id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`position` integer NOT NULL,
	`name` text NOT NULL,
	`mass_kg` real NOT NULL,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `group_thing_trip` ON `group_thing` (`trip_id`);--> statement-breakpoint
CREATE TABLE `kit_search` (
	`trip_id` text PRIMARY KEY NOT NULL,
	`settings` text NOT NULL,
	`outcome` text NOT NULL,
	`basis` text NOT NULL,
	`found_by_name` text NOT NULL,
	`found_at` integer NOT NULL,
	`accepted_at` integer,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `person_load` (
	`person_id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`base_mass_kg` real,
	`body_mass_kg` real,
	`limit_share` real,
	`limit_kg` real,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `person_load_trip` ON `person_load` (`trip_id`);--> statement-breakpoint
CREATE TABLE `shelter_split` (
	`shelter_id` text PRIMARY KEY NOT NULL,
	`trip_id` text NOT NULL,
	`poles_mass_kg` real,
	`stays_with_sleepers` integer DEFAULT false NOT NULL,
	FOREIGN KEY (`shelter_id`) REFERENCES `shelter`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`trip_id`) REFERENCES `trip`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `shelter_split_trip` ON `shelter_split` (`trip_id`);--> statement-breakpoint
ALTER TABLE `carry` ADD `group_thing_id` text;--> statement-breakpoint
ALTER TABLE `carry` ADD `part` text;--> statement-breakpoint
ALTER TABLE `carry` ADD `is_fixed` integer DEFAULT false NOT NULL;