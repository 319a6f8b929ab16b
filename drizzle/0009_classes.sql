CREATE TABLE `class_guesses` (
	`class_id` text NOT NULL,
	`scene` text NOT NULL,
	`participant` text NOT NULL,
	`value` real NOT NULL,
	PRIMARY KEY(`class_id`, `scene`, `participant`),
	FOREIGN KEY (`class_id`) REFERENCES `classes`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `classes` (
	`id` text PRIMARY KEY NOT NULL,
	`code` text NOT NULL,
	`opened_by` text NOT NULL,
	`opened_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`closed_at` integer,
	`step` integer DEFAULT 0 NOT NULL,
	`scene` text,
	FOREIGN KEY (`opened_by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `classes_code_unique` ON `classes` (`code`);--> statement-breakpoint
CREATE INDEX `classes_by_trainer` ON `classes` (`opened_by`);