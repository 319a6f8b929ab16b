CREATE TABLE `order_ticks` (
	`id` text PRIMARY KEY NOT NULL,
	`order_id` text NOT NULL,
	`item` text NOT NULL,
	`is_done` integer NOT NULL,
	`at` integer NOT NULL,
	`received_at` integer NOT NULL,
	FOREIGN KEY (`order_id`) REFERENCES `orders`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `ticks_by_order` ON `order_ticks` (`order_id`);--> statement-breakpoint
CREATE TABLE `orders` (
	`id` text PRIMARY KEY NOT NULL,
	`project_id` text NOT NULL,
	`number` integer NOT NULL,
	`line_id` text NOT NULL,
	`scenario_id` text NOT NULL,
	`scenario_version` integer NOT NULL,
	`content` text NOT NULL,
	`token` text NOT NULL,
	`file_id` text NOT NULL,
	`file_sha256` text NOT NULL,
	`pages` integer NOT NULL,
	`issued_at` integer NOT NULL,
	`issued_by` text NOT NULL,
	`expires_at` integer NOT NULL,
	`withdrawn_at` integer,
	`withdrawn_by` text,
	`withdrawal_reason` text DEFAULT '' NOT NULL,
	`replaced_at` integer,
	`replaced_by` text,
	FOREIGN KEY (`project_id`) REFERENCES `projects`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`issued_by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`withdrawn_by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `orders_token_unique` ON `orders` (`token`);--> statement-breakpoint
CREATE UNIQUE INDEX `orders_file_id_unique` ON `orders` (`file_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `orders_by_number` ON `orders` (`project_id`,`number`);--> statement-breakpoint
CREATE INDEX `orders_by_line` ON `orders` (`line_id`);