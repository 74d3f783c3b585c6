ALTER TABLE `points` ADD `row` integer;--> statement-breakpoint
ALTER TABLE `points` ADD `sheet` text;