CREATE TABLE `forecasts` (
	`id` text PRIMARY KEY NOT NULL,
	`gauge_id` text NOT NULL,
	`origin` text NOT NULL,
	`issued_at` integer NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`call` text,
	`gauge` text NOT NULL,
	`readings` text NOT NULL,
	`observed` text NOT NULL,
	`shift` text,
	`crest` text,
	`reading_count` integer NOT NULL,
	`observed_count` integer NOT NULL,
	`created_at` integer NOT NULL,
	`created_by` text NOT NULL,
	FOREIGN KEY (`gauge_id`) REFERENCES `gauges`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`created_by`) REFERENCES `accounts`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `forecasts_by_gauge` ON `forecasts` (`gauge_id`,`issued_at`);