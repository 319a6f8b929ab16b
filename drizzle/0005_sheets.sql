CREATE TABLE `sheet_comments` (
	`id` text PRIMARY KEY NOT NULL,
	`sheet_id` text NOT NULL,
	`line` text,
	`text` text NOT NULL,
	`at` integer NOT NULL,
	`by` text NOT NULL,
	`answer` text DEFAULT '' NOT NULL,
	`answered_at` integer,
	`answered_by` text,
	`resolved_at` integer,
	`resolved_by` text,
	FOREIGN KEY (`sheet_id`) REFERENCES `sheets`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`answered_by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`resolved_by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `comments_by_sheet` ON `sheet_comments` (`sheet_id`);--> statement-breakpoint
CREATE TABLE `sheet_files` (
	`sheet_id` text NOT NULL,
	`page` integer NOT NULL,
	`file_id` text NOT NULL,
	`size` integer NOT NULL,
	`sha256` text NOT NULL,
	PRIMARY KEY(`sheet_id`, `page`),
	FOREIGN KEY (`sheet_id`) REFERENCES `sheets`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `sheet_files_file_id_unique` ON `sheet_files` (`file_id`);--> statement-breakpoint
CREATE TABLE `sheet_issues` (
	`id` text PRIMARY KEY NOT NULL,
	`sheet_id` text NOT NULL,
	`recipient` text NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`at` integer NOT NULL,
	`by` text NOT NULL,
	FOREIGN KEY (`sheet_id`) REFERENCES `sheets`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `issues_by_sheet` ON `sheet_issues` (`sheet_id`);--> statement-breakpoint
CREATE TABLE `sheet_marks` (
	`sheet_id` text NOT NULL,
	`line` text NOT NULL,
	`is_ticked` integer NOT NULL,
	`figure` real,
	`note` text DEFAULT '' NOT NULL,
	`at` integer NOT NULL,
	`by` text NOT NULL,
	PRIMARY KEY(`sheet_id`, `line`),
	FOREIGN KEY (`sheet_id`) REFERENCES `sheets`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `sheet_moves` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`sheet_id` text NOT NULL,
	`move` text NOT NULL,
	`from` text NOT NULL,
	`to` text NOT NULL,
	`reason` text DEFAULT '' NOT NULL,
	`at` integer NOT NULL,
	`by` text NOT NULL,
	FOREIGN KEY (`sheet_id`) REFERENCES `sheets`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `moves_by_sheet` ON `sheet_moves` (`sheet_id`);--> statement-breakpoint
CREATE TABLE `sheet_settings` (
	`project_id` text PRIMARY KEY NOT NULL,
	`number_pattern` text NOT NULL,
	`separate_approver` text NOT NULL,
	`last_number` integer DEFAULT 0 NOT NULL,
	FOREIGN KEY (`project_id`) REFERENCES `projects`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `sheets` (
	`id` text PRIMARY KEY NOT NULL,
	`project_id` text NOT NULL,
	`number` text NOT NULL,
	`revision` text NOT NULL,
	`status` text NOT NULL,
	`category` integer NOT NULL,
	`content` text NOT NULL,
	`line_id` text NOT NULL,
	`scenario_id` text NOT NULL,
	`scenario_version` integer NOT NULL,
	`place` real NOT NULL,
	`previous_id` text,
	`prepared_by` text NOT NULL,
	`prepared_for` text NOT NULL,
	`prepared_at` integer,
	`checked_by` text,
	`checked_at` integer,
	`approved_by` text,
	`issued_at` integer,
	`code` text,
	`digest` text DEFAULT '' NOT NULL,
	`file_id` text,
	`file_sha256` text DEFAULT '' NOT NULL,
	`pages` integer DEFAULT 0 NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	`updated_by` text NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`project_id`) REFERENCES `projects`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`prepared_by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`prepared_for`) REFERENCES `organisations`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`checked_by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`approved_by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`updated_by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `sheets_code_unique` ON `sheets` (`code`);--> statement-breakpoint
CREATE UNIQUE INDEX `sheets_by_number` ON `sheets` (`project_id`,`number`,`revision`);--> statement-breakpoint
CREATE INDEX `sheets_by_file` ON `sheets` (`file_sha256`);