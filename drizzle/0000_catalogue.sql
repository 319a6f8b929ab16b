CREATE TABLE `barriers` (
	`id` text PRIMARY KEY NOT NULL,
	`diameter` real NOT NULL,
	`skirt_length` real NOT NULL,
	`contact_width` real NOT NULL,
	`mass` real NOT NULL,
	`air_pressure` real NOT NULL,
	`section_length` real NOT NULL,
	`fabric_strength` real NOT NULL,
	`stated_height` real NOT NULL,
	`is_example` integer NOT NULL,
	`position` integer NOT NULL,
	`source` text NOT NULL,
	`revision` integer DEFAULT 1 NOT NULL,
	`origin` text DEFAULT 'user' NOT NULL
);
--> statement-breakpoint
CREATE TABLE `check_bases` (
	`id` text PRIMARY KEY NOT NULL,
	`format` text NOT NULL,
	`sliding` real NOT NULL,
	`overturning` real,
	`flotation` real NOT NULL,
	`fabric` real NOT NULL,
	`edition` text NOT NULL,
	`tag` text NOT NULL,
	`position` integer NOT NULL,
	`source` text NOT NULL,
	`revision` integer DEFAULT 1 NOT NULL,
	`origin` text DEFAULT 'user' NOT NULL
);
--> statement-breakpoint
CREATE TABLE `grounds` (
	`id` text PRIMARY KEY NOT NULL,
	`friction` real NOT NULL,
	`permeability` real NOT NULL,
	`layer_thickness` real NOT NULL,
	`is_suitable` integer NOT NULL,
	`is_unverified` integer NOT NULL,
	`tag` text NOT NULL,
	`position` integer NOT NULL,
	`source` text NOT NULL,
	`revision` integer DEFAULT 1 NOT NULL,
	`origin` text DEFAULT 'user' NOT NULL
);
--> statement-breakpoint
CREATE TABLE `meta` (
	`key` text PRIMARY KEY NOT NULL,
	`value` text NOT NULL
);
