ALTER TABLE `files` ADD `column_roles` text;--> statement-breakpoint
ALTER TABLE `files` ADD `column_roles_revision` integer DEFAULT 0 NOT NULL;