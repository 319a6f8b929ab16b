DROP INDEX `scenarios_by_line`;--> statement-breakpoint
DROP INDEX `scenarios_by_name`;--> statement-breakpoint
CREATE INDEX `scenarios_in_table` ON `scenarios` (`line_id`,`archived_at`,`updated_at`,`name`,`note`,`verdict`,`water_level`,`holds_to_level`,`id`);