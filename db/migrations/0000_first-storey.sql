CREATE TABLE `audits` (
	`id` text PRIMARY KEY NOT NULL,
	`round_id` text NOT NULL,
	`status` text NOT NULL,
	`stage` text DEFAULT 'opening' NOT NULL,
	`progress` real DEFAULT 0 NOT NULL,
	`trouble` text,
	`engine` text,
	`pages` integer,
	`title` text,
	`document_sha256` text,
	`table_file` text,
	`table_rows` integer,
	`table_sha256` text,
	`alpha` real,
	`alpha_quote` text,
	`alpha_page` integer,
	`queued_at` integer NOT NULL,
	`started_at` integer,
	`finished_at` integer,
	FOREIGN KEY (`round_id`) REFERENCES `rounds`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `audits_round_queued` ON `audits` (`round_id`,`queued_at`);--> statement-breakpoint
CREATE TABLE `claims` (
	`audit_id` text NOT NULL,
	`key` text NOT NULL,
	`position` integer NOT NULL,
	`source` text NOT NULL,
	`page` integer,
	`row` integer,
	`sheet` text,
	`quote` text NOT NULL,
	`boxes` text NOT NULL,
	`procedure` text NOT NULL,
	`m` integer,
	`alpha` real,
	`threshold` real,
	`groups` integer,
	PRIMARY KEY(`audit_id`, `key`),
	FOREIGN KEY (`audit_id`) REFERENCES `audits`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `claims_audit_position` ON `claims` (`audit_id`,`position`);--> statement-breakpoint
CREATE TABLE `families` (
	`audit_id` text NOT NULL,
	`key` text NOT NULL,
	`position` integer NOT NULL,
	`label` text NOT NULL,
	`members` text NOT NULL,
	`claim` text,
	`groups` integer,
	`m_printed` integer NOT NULL,
	`m_claimed` integer,
	`m_due` integer,
	`m_why` text NOT NULL,
	`outcome` text NOT NULL,
	`why` text NOT NULL,
	`decisions` text NOT NULL,
	`fits` text NOT NULL,
	PRIMARY KEY(`audit_id`, `key`),
	FOREIGN KEY (`audit_id`) REFERENCES `audits`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `families_audit_position` ON `families` (`audit_id`,`position`);--> statement-breakpoint
CREATE INDEX `families_outcome` ON `families` (`outcome`);--> statement-breakpoint
CREATE TABLE `findings` (
	`audit_id` text NOT NULL,
	`key` text NOT NULL,
	`position` integer NOT NULL,
	`rule` text NOT NULL,
	`severity` text NOT NULL,
	`family` text,
	`reports` text NOT NULL,
	`place` text,
	`says` text NOT NULL,
	`asks` text NOT NULL,
	`cites` text NOT NULL,
	PRIMARY KEY(`audit_id`, `key`),
	FOREIGN KEY (`audit_id`) REFERENCES `audits`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `findings_audit_position` ON `findings` (`audit_id`,`position`);--> statement-breakpoint
CREATE INDEX `findings_rule` ON `findings` (`rule`);--> statement-breakpoint
CREATE TABLE `reports` (
	`audit_id` text NOT NULL,
	`key` text NOT NULL,
	`position` integer NOT NULL,
	`source` text NOT NULL,
	`page` integer,
	`row` integer,
	`sheet` text,
	`quote` text NOT NULL,
	`boxes` text NOT NULL,
	`relation` text NOT NULL,
	`value` real NOT NULL,
	`decimals` integer NOT NULL,
	`low` real NOT NULL,
	`high` real NOT NULL,
	`scale` text NOT NULL,
	`statistic` text,
	`comparison_a` text,
	`comparison_b` text,
	`called` text,
	`family` text,
	PRIMARY KEY(`audit_id`, `key`),
	FOREIGN KEY (`audit_id`) REFERENCES `audits`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `reports_audit_position` ON `reports` (`audit_id`,`position`);--> statement-breakpoint
CREATE INDEX `reports_audit_family` ON `reports` (`audit_id`,`family`);--> statement-breakpoint
CREATE TABLE `statistics` (
	`audit_id` text NOT NULL,
	`key` text NOT NULL,
	`position` integer NOT NULL,
	`source` text NOT NULL,
	`page` integer,
	`row` integer,
	`sheet` text,
	`quote` text NOT NULL,
	`boxes` text NOT NULL,
	`test` text NOT NULL,
	`df` text NOT NULL,
	`value` real NOT NULL,
	`decimals` integer NOT NULL,
	`p_low` real,
	`p_high` real,
	`report` text,
	PRIMARY KEY(`audit_id`, `key`),
	FOREIGN KEY (`audit_id`) REFERENCES `audits`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `statistics_audit_position` ON `statistics` (`audit_id`,`position`);--> statement-breakpoint
CREATE TABLE `mailed_links` (
	`id` text PRIMARY KEY NOT NULL,
	`purpose` text NOT NULL,
	`person_id` text NOT NULL,
	`token_hash` text NOT NULL,
	`created_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`used_at` integer,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `mailed_links_token` ON `mailed_links` (`token_hash`);--> statement-breakpoint
CREATE INDEX `mailed_links_person` ON `mailed_links` (`person_id`);--> statement-breakpoint
CREATE TABLE `people` (
	`id` text PRIMARY KEY NOT NULL,
	`email` text NOT NULL,
	`name` text NOT NULL,
	`affiliation` text DEFAULT '' NOT NULL,
	`expertise` text DEFAULT '' NOT NULL,
	`status` text NOT NULL,
	`password_hash` text,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `people_email` ON `people` (`email`);--> statement-breakpoint
CREATE INDEX `people_status_name` ON `people` (`status`,`name`);--> statement-breakpoint
CREATE TABLE `person_roles` (
	`person_id` text NOT NULL,
	`role` text NOT NULL,
	PRIMARY KEY(`person_id`, `role`),
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `person_roles_role` ON `person_roles` (`role`);--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` text PRIMARY KEY NOT NULL,
	`person_id` text NOT NULL,
	`created_at` integer NOT NULL,
	`seen_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`revoked_at` integer,
	`agent` text DEFAULT '' NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `sessions_person` ON `sessions` (`person_id`);--> statement-breakpoint
CREATE TABLE `sign_in_tries` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`key` text NOT NULL,
	`at` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `sign_in_tries_key_at` ON `sign_in_tries` (`key`,`at`);--> statement-breakpoint
CREATE TABLE `files` (
	`id` text PRIMARY KEY NOT NULL,
	`round_id` text NOT NULL,
	`kind` text NOT NULL,
	`name` text NOT NULL,
	`media_type` text NOT NULL,
	`sha256` text NOT NULL,
	`bytes` integer NOT NULL,
	`uploaded_by` text NOT NULL,
	`created_at` integer NOT NULL,
	`replaced_at` integer,
	FOREIGN KEY (`round_id`) REFERENCES `rounds`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`uploaded_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `files_round_kind` ON `files` (`round_id`,`kind`);--> statement-breakpoint
CREATE INDEX `files_sha256` ON `files` (`sha256`);--> statement-breakpoint
CREATE INDEX `files_uploaded_by` ON `files` (`uploaded_by`);--> statement-breakpoint
CREATE TABLE `house_rules_versions` (
	`version` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`body` text NOT NULL,
	`created_by` text,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`created_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `house_rules_versions_created_by` ON `house_rules_versions` (`created_by`);--> statement-breakpoint
CREATE TABLE `manuscripts` (
	`id` text PRIMARY KEY NOT NULL,
	`reference` text,
	`submitter_id` text NOT NULL,
	`title` text DEFAULT '' NOT NULL,
	`corresponding_author` text DEFAULT '' NOT NULL,
	`corresponding_email` text DEFAULT '' NOT NULL,
	`state` text NOT NULL,
	`state_since` integer NOT NULL,
	`current_round` integer DEFAULT 1 NOT NULL,
	`created_at` integer NOT NULL,
	`received_at` integer,
	`due_at` integer,
	FOREIGN KEY (`submitter_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `manuscripts_reference` ON `manuscripts` (`reference`);--> statement-breakpoint
CREATE INDEX `manuscripts_submitter_received` ON `manuscripts` (`submitter_id`,`received_at`);--> statement-breakpoint
CREATE INDEX `manuscripts_state_since` ON `manuscripts` (`state`,`state_since`);--> statement-breakpoint
CREATE INDEX `manuscripts_received` ON `manuscripts` (`received_at`);--> statement-breakpoint
CREATE INDEX `manuscripts_due` ON `manuscripts` (`due_at`);--> statement-breakpoint
CREATE INDEX `manuscripts_title` ON `manuscripts` (`title`);--> statement-breakpoint
CREATE TABLE `rounds` (
	`id` text PRIMARY KEY NOT NULL,
	`manuscript_id` text NOT NULL,
	`number` integer NOT NULL,
	`house_rules_version` integer NOT NULL,
	`alpha` real,
	`correction` text DEFAULT '' NOT NULL,
	`primary_outcome` text DEFAULT '' NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`opened_at` integer NOT NULL,
	`handed_in_at` integer,
	`closed_at` integer,
	FOREIGN KEY (`manuscript_id`) REFERENCES `manuscripts`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`house_rules_version`) REFERENCES `house_rules_versions`(`version`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `rounds_manuscript_number` ON `rounds` (`manuscript_id`,`number`);--> statement-breakpoint
CREATE INDEX `rounds_house_rules_version` ON `rounds` (`house_rules_version`);--> statement-breakpoint
CREATE TABLE `answers` (
	`id` text PRIMARY KEY NOT NULL,
	`point_id` text NOT NULL,
	`author_id` text NOT NULL,
	`body` text NOT NULL,
	`created_at` integer NOT NULL,
	`changed_at` integer,
	FOREIGN KEY (`point_id`) REFERENCES `points`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`author_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `answers_point` ON `answers` (`point_id`);--> statement-breakpoint
CREATE INDEX `answers_author` ON `answers` (`author_id`);--> statement-breakpoint
CREATE TABLE `assignments` (
	`id` text PRIMARY KEY NOT NULL,
	`manuscript_id` text NOT NULL,
	`round_id` text NOT NULL,
	`reviewer_id` text NOT NULL,
	`assigned_by` text NOT NULL,
	`status` text NOT NULL,
	`reason` text DEFAULT '' NOT NULL,
	`due_at` integer NOT NULL,
	`created_at` integer NOT NULL,
	`answered_at` integer,
	`ended_at` integer,
	FOREIGN KEY (`manuscript_id`) REFERENCES `manuscripts`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`round_id`) REFERENCES `rounds`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`reviewer_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`assigned_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `assignments_reviewer_status_due` ON `assignments` (`reviewer_id`,`status`,`due_at`);--> statement-breakpoint
CREATE INDEX `assignments_manuscript_status` ON `assignments` (`manuscript_id`,`status`);--> statement-breakpoint
CREATE INDEX `assignments_round` ON `assignments` (`round_id`);--> statement-breakpoint
CREATE INDEX `assignments_assigned_by` ON `assignments` (`assigned_by`);--> statement-breakpoint
CREATE TABLE `changes` (
	`id` text PRIMARY KEY NOT NULL,
	`audit_id` text NOT NULL,
	`person_id` text NOT NULL,
	`kind` text NOT NULL,
	`target_key` text NOT NULL,
	`before` text,
	`after` text,
	`reason` text DEFAULT '' NOT NULL,
	`created_at` integer NOT NULL,
	`undone_at` integer,
	FOREIGN KEY (`audit_id`) REFERENCES `audits`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `changes_audit_created` ON `changes` (`audit_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `changes_person` ON `changes` (`person_id`);--> statement-breakpoint
CREATE TABLE `comments` (
	`id` text PRIMARY KEY NOT NULL,
	`round_id` text NOT NULL,
	`author_id` text NOT NULL,
	`audience` text NOT NULL,
	`target` text NOT NULL,
	`target_key` text,
	`target_label` text DEFAULT '' NOT NULL,
	`page` integer,
	`boxes` text,
	`parent_id` text,
	`body` text NOT NULL,
	`created_at` integer NOT NULL,
	`changed_at` integer,
	`resolved_at` integer,
	`resolved_by` text,
	FOREIGN KEY (`round_id`) REFERENCES `rounds`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`author_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`resolved_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `comments_round_created` ON `comments` (`round_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `comments_author` ON `comments` (`author_id`);--> statement-breakpoint
CREATE INDEX `comments_parent` ON `comments` (`parent_id`);--> statement-breakpoint
CREATE INDEX `comments_resolved_by` ON `comments` (`resolved_by`);--> statement-breakpoint
CREATE TABLE `conflicts` (
	`id` text PRIMARY KEY NOT NULL,
	`manuscript_id` text NOT NULL,
	`person_id` text NOT NULL,
	`declared_by` text NOT NULL,
	`reason` text NOT NULL,
	`created_at` integer NOT NULL,
	`lifted_at` integer,
	`lifted_by` text,
	FOREIGN KEY (`manuscript_id`) REFERENCES `manuscripts`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`declared_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`lifted_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `conflicts_manuscript_person` ON `conflicts` (`manuscript_id`,`person_id`);--> statement-breakpoint
CREATE INDEX `conflicts_person` ON `conflicts` (`person_id`);--> statement-breakpoint
CREATE INDEX `conflicts_declared_by` ON `conflicts` (`declared_by`);--> statement-breakpoint
CREATE INDEX `conflicts_lifted_by` ON `conflicts` (`lifted_by`);--> statement-breakpoint
CREATE TABLE `letters` (
	`id` text PRIMARY KEY NOT NULL,
	`verdict_id` text NOT NULL,
	`version` integer NOT NULL,
	`verdict` text NOT NULL,
	`subject` text NOT NULL,
	`body` text NOT NULL,
	`html` text NOT NULL,
	`text` text NOT NULL,
	`sent_at` integer NOT NULL,
	`sent_by` text NOT NULL,
	FOREIGN KEY (`verdict_id`) REFERENCES `verdicts`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`sent_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `letters_verdict_version` ON `letters` (`verdict_id`,`version`);--> statement-breakpoint
CREATE INDEX `letters_sent_by` ON `letters` (`sent_by`);--> statement-breakpoint
CREATE TABLE `points` (
	`id` text PRIMARY KEY NOT NULL,
	`round_id` text NOT NULL,
	`audit_id` text,
	`finding_key` text,
	`rule` text,
	`family_key` text,
	`family_label` text DEFAULT '' NOT NULL,
	`status` text NOT NULL,
	`reason` text DEFAULT '' NOT NULL,
	`severity` text NOT NULL,
	`says` text DEFAULT '' NOT NULL,
	`asks` text NOT NULL,
	`quote` text DEFAULT '' NOT NULL,
	`page` integer,
	`cites` text NOT NULL,
	`position` integer NOT NULL,
	`decided_by` text,
	`decided_at` integer,
	FOREIGN KEY (`round_id`) REFERENCES `rounds`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`audit_id`) REFERENCES `audits`(`id`) ON UPDATE no action ON DELETE set null,
	FOREIGN KEY (`decided_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `points_round_position` ON `points` (`round_id`,`position`);--> statement-breakpoint
CREATE UNIQUE INDEX `points_audit_finding` ON `points` (`audit_id`,`finding_key`);--> statement-breakpoint
CREATE INDEX `points_decided_by` ON `points` (`decided_by`);--> statement-breakpoint
CREATE INDEX `points_rule_status` ON `points` (`rule`,`status`);--> statement-breakpoint
CREATE TABLE `verdicts` (
	`id` text PRIMARY KEY NOT NULL,
	`round_id` text NOT NULL,
	`reviewer_id` text NOT NULL,
	`verdict` text NOT NULL,
	`remark` text DEFAULT '' NOT NULL,
	`effort_minutes` integer,
	`body` text NOT NULL,
	`status` text NOT NULL,
	`sent_back_reason` text DEFAULT '' NOT NULL,
	`drafted_at` integer NOT NULL,
	`changed_at` integer NOT NULL,
	`released_at` integer,
	`released_by` text,
	FOREIGN KEY (`round_id`) REFERENCES `rounds`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`reviewer_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`released_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `verdicts_round` ON `verdicts` (`round_id`);--> statement-breakpoint
CREATE INDEX `verdicts_reviewer` ON `verdicts` (`reviewer_id`);--> statement-breakpoint
CREATE INDEX `verdicts_released_by` ON `verdicts` (`released_by`);--> statement-breakpoint
CREATE TABLE `jobs` (
	`id` text PRIMARY KEY NOT NULL,
	`kind` text NOT NULL,
	`subject_id` text NOT NULL,
	`status` text NOT NULL,
	`attempts` integer DEFAULT 0 NOT NULL,
	`max_attempts` integer NOT NULL,
	`run_at` integer NOT NULL,
	`lease_until` integer,
	`leased_by` text,
	`trouble` text,
	`created_at` integer NOT NULL,
	`finished_at` integer
);
--> statement-breakpoint
CREATE INDEX `jobs_status_run_at` ON `jobs` (`status`,`run_at`);--> statement-breakpoint
CREATE UNIQUE INDEX `jobs_kind_subject` ON `jobs` (`kind`,`subject_id`);--> statement-breakpoint
CREATE TABLE `mails` (
	`id` text PRIMARY KEY NOT NULL,
	`manuscript_id` text,
	`template` text NOT NULL,
	`recipient` text NOT NULL,
	`subject` text NOT NULL,
	`text` text NOT NULL,
	`html` text NOT NULL,
	`message_id` text NOT NULL,
	`status` text NOT NULL,
	`attempts` integer DEFAULT 0 NOT NULL,
	`trouble` text,
	`created_at` integer NOT NULL,
	`sent_at` integer,
	FOREIGN KEY (`manuscript_id`) REFERENCES `manuscripts`(`id`) ON UPDATE no action ON DELETE set null
);
--> statement-breakpoint
CREATE UNIQUE INDEX `mails_message_id` ON `mails` (`message_id`);--> statement-breakpoint
CREATE INDEX `mails_status_created` ON `mails` (`status`,`created_at`);--> statement-breakpoint
CREATE INDEX `mails_manuscript` ON `mails` (`manuscript_id`);--> statement-breakpoint
CREATE TABLE `record` (
	`sequence` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`at` integer NOT NULL,
	`event` text NOT NULL,
	`actor_id` text NOT NULL,
	`actor_name` text NOT NULL,
	`manuscript_id` text,
	`subject` text,
	`detail` text NOT NULL
);
--> statement-breakpoint
CREATE INDEX `record_manuscript_at` ON `record` (`manuscript_id`,`at`);--> statement-breakpoint
CREATE INDEX `record_actor_at` ON `record` (`actor_id`,`at`);--> statement-breakpoint
CREATE INDEX `record_event_at` ON `record` (`event`,`at`);