CREATE TABLE `depots` (
	`id` text PRIMARY KEY NOT NULL,
	`organisation_id` text NOT NULL,
	`name` text NOT NULL,
	`call_out_time` real NOT NULL,
	`load_time` real NOT NULL,
	`drive_time` real NOT NULL,
	`crews` text NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`created_at` integer NOT NULL,
	`created_by` text NOT NULL,
	`updated_at` integer NOT NULL,
	`updated_by` text NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`created_by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`updated_by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `depots_by_organisation` ON `depots` (`organisation_id`);--> statement-breakpoint
CREATE TABLE `store_items` (
	`depot_id` text NOT NULL,
	`position` integer NOT NULL,
	`kind` text NOT NULL,
	`barrier_id` text,
	`diameter` real,
	`mass` real,
	`serviceable` integer NOT NULL,
	`in_repair` integer DEFAULT 0 NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	PRIMARY KEY(`depot_id`, `position`),
	FOREIGN KEY (`depot_id`) REFERENCES `depots`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
ALTER TABLE `lines` ADD `marks` text DEFAULT '[]' NOT NULL;--> statement-breakpoint
ALTER TABLE `lines` ADD `ends` text DEFAULT '{"start":{"kind":"ground","level":null,"width":null,"note":""},"end":{"kind":"ground","level":null,"width":null,"note":""}}' NOT NULL;--> statement-breakpoint
ALTER TABLE `lines` ADD `background` text;