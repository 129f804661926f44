CREATE TABLE `shelf` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`owner_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(80) character set utf8mb4 collate utf8mb4_unicode_ci NOT NULL,
	`voicing` json NOT NULL,
	`kept_at` datetime(3) NOT NULL,
	`request_key` varchar(36) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `shelf_id` PRIMARY KEY(`id`),
	CONSTRAINT `shelf_request` UNIQUE(`owner_id`,`request_key`)
);
--> statement-breakpoint
CREATE TABLE `study_tags` (
	`account_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`study_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`tag` varchar(40) character set utf8mb4 collate utf8mb4_unicode_ci NOT NULL,
	CONSTRAINT `study_tags_account_id_study_id_tag_pk` PRIMARY KEY(`account_id`,`study_id`,`tag`)
);
--> statement-breakpoint
ALTER TABLE `saves` ADD `device_key` varchar(36) character set ascii collate ascii_bin;--> statement-breakpoint
ALTER TABLE `saves` ADD `merge` json;--> statement-breakpoint
ALTER TABLE `saves` ADD `name` varchar(80) character set utf8mb4 collate utf8mb4_unicode_ci;--> statement-breakpoint
ALTER TABLE `studies` ADD `title` varchar(120) character set utf8mb4 collate utf8mb4_unicode_ci DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE `studies` ADD `about` varchar(2000) character set utf8mb4 collate utf8mb4_unicode_ci DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE `studies` ADD `key_tonic` varchar(2) character set ascii collate ascii_bin DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE `studies` ADD `key_mode` varchar(12) character set ascii collate ascii_bin DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE `studies` ADD `chord_count` int DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE `studies` ADD `cloudiest` double DEFAULT -1 NOT NULL;--> statement-breakpoint
ALTER TABLE `studies` ADD `summary` json;--> statement-breakpoint
ALTER TABLE `studies` ADD `summary_due` boolean DEFAULT true NOT NULL;--> statement-breakpoint
ALTER TABLE `shelf` ADD CONSTRAINT `shelf_owner_id_accounts_id_fk` FOREIGN KEY (`owner_id`) REFERENCES `accounts`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `study_tags` ADD CONSTRAINT `study_tags_account_id_accounts_id_fk` FOREIGN KEY (`account_id`) REFERENCES `accounts`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `study_tags` ADD CONSTRAINT `study_tags_study_id_studies_id_fk` FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `shelf_owner_newest` ON `shelf` (`owner_id`,`kept_at`,`id`);--> statement-breakpoint
CREATE INDEX `study_tags_tag` ON `study_tags` (`account_id`,`tag`,`study_id`);--> statement-breakpoint
CREATE INDEX `saves_age` ON `saves` (`kind`,`saved_at`);--> statement-breakpoint
CREATE INDEX `studies_owner_title` ON `studies` (`owner_id`,`deleted_at`,`title`,`id`);--> statement-breakpoint
CREATE INDEX `studies_owner_cloudiest` ON `studies` (`owner_id`,`deleted_at`,`cloudiest`,`id`);--> statement-breakpoint
CREATE INDEX `studies_summary_due` ON `studies` (`summary_due`);--> statement-breakpoint
CREATE INDEX `studies_deleted` ON `studies` (`deleted_at`);