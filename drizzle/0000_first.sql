CREATE TABLE `accounts` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`email` varchar(254) character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`name` varchar(80) character set utf8mb4 collate utf8mb4_unicode_ci NOT NULL,
	`role` enum('composer','teacher','student','administrator') NOT NULL,
	`password_hash` varchar(60) character set ascii collate ascii_bin NOT NULL,
	`confirmed_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `accounts_id` PRIMARY KEY(`id`),
	CONSTRAINT `accounts_email_unique` UNIQUE(`email`)
);
--> statement-breakpoint
CREATE TABLE `annotations` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`study_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`author_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`chord_id` varchar(36) character set ascii collate ascii_bin,
	`text` mediumtext character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`written_at` datetime(3) NOT NULL,
	`request_key` varchar(36) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `annotations_id` PRIMARY KEY(`id`),
	CONSTRAINT `annotations_request` UNIQUE(`study_id`,`author_id`,`request_key`)
);
--> statement-breakpoint
CREATE TABLE `demo_mails` (
	`id` bigint unsigned AUTO_INCREMENT NOT NULL,
	`to` varchar(400) character set utf8mb4 collate utf8mb4_unicode_ci NOT NULL,
	`from` varchar(400) character set utf8mb4 collate utf8mb4_unicode_ci NOT NULL,
	`subject` varchar(300) character set utf8mb4 collate utf8mb4_unicode_ci NOT NULL,
	`text` mediumtext character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`received_at` datetime(3) NOT NULL,
	CONSTRAINT `demo_mails_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `limits` (
	`id` binary(32) NOT NULL,
	`count` int NOT NULL,
	`blocked_until` datetime(3),
	`resets_at` datetime(3) NOT NULL,
	CONSTRAINT `limits_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `outbox` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`to_email` varchar(254) character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`to_name` varchar(80) character set utf8mb4 collate utf8mb4_unicode_ci NOT NULL,
	`subject` varchar(300) character set utf8mb4 collate utf8mb4_unicode_ci NOT NULL,
	`text` mediumtext character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`html` mediumtext character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`attempts` int NOT NULL DEFAULT 0,
	`due_at` datetime(3),
	`sent_at` datetime(3),
	`given_up_at` datetime(3),
	`last_fault` varchar(40) character set ascii collate ascii_bin,
	CONSTRAINT `outbox_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `saves` (
	`study_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`kind` enum('accepted','set-aside') NOT NULL,
	`number` int NOT NULL,
	`based_on` int NOT NULL,
	`document` json NOT NULL,
	`saved_by` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`saved_at` datetime(3) NOT NULL,
	`request_key` varchar(36) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `saves_study_id_kind_number_pk` PRIMARY KEY(`study_id`,`kind`,`number`),
	CONSTRAINT `saves_request` UNIQUE(`study_id`,`saved_by`,`request_key`)
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` binary(32) NOT NULL,
	`user_id` varchar(36) character set ascii collate ascii_bin,
	`data` mediumtext character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`ends_at` datetime(3) NOT NULL,
	`ended_at` datetime(3),
	CONSTRAINT `sessions_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `shares` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`study_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`email` varchar(254) character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`may` enum('view','comment') NOT NULL,
	`shared_at` datetime(3) NOT NULL,
	CONSTRAINT `shares_id` PRIMARY KEY(`id`),
	CONSTRAINT `shares_once` UNIQUE(`study_id`,`email`)
);
--> statement-breakpoint
CREATE TABLE `studies` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`owner_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`newest_number` int NOT NULL,
	`set_aside_count` int NOT NULL DEFAULT 0,
	`saved_at` datetime(3) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`deleted_at` datetime(3),
	`request_key` varchar(36) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `studies_id` PRIMARY KEY(`id`),
	CONSTRAINT `studies_request` UNIQUE(`owner_id`,`request_key`)
);
--> statement-breakpoint
CREATE TABLE `tokens` (
	`digest` binary(32) NOT NULL,
	`account_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`purpose` enum('confirmation','password-reset') NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`used_at` datetime(3),
	CONSTRAINT `tokens_digest` PRIMARY KEY(`digest`)
);
--> statement-breakpoint
ALTER TABLE `annotations` ADD CONSTRAINT `annotations_study_id_studies_id_fk` FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `annotations` ADD CONSTRAINT `annotations_author_id_accounts_id_fk` FOREIGN KEY (`author_id`) REFERENCES `accounts`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `saves` ADD CONSTRAINT `saves_study_id_studies_id_fk` FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `saves` ADD CONSTRAINT `saves_saved_by_accounts_id_fk` FOREIGN KEY (`saved_by`) REFERENCES `accounts`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sessions` ADD CONSTRAINT `sessions_user_id_accounts_id_fk` FOREIGN KEY (`user_id`) REFERENCES `accounts`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `shares` ADD CONSTRAINT `shares_study_id_studies_id_fk` FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `studies` ADD CONSTRAINT `studies_owner_id_accounts_id_fk` FOREIGN KEY (`owner_id`) REFERENCES `accounts`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `tokens` ADD CONSTRAINT `tokens_account_id_accounts_id_fk` FOREIGN KEY (`account_id`) REFERENCES `accounts`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `annotations_study` ON `annotations` (`study_id`,`written_at`,`id`);--> statement-breakpoint
CREATE INDEX `demo_mails_received` ON `demo_mails` (`received_at`);--> statement-breakpoint
CREATE INDEX `limits_reset` ON `limits` (`resets_at`);--> statement-breakpoint
CREATE INDEX `outbox_due` ON `outbox` (`due_at`);--> statement-breakpoint
CREATE INDEX `sessions_user` ON `sessions` (`user_id`);--> statement-breakpoint
CREATE INDEX `sessions_expiry` ON `sessions` (`expires_at`);--> statement-breakpoint
CREATE INDEX `shares_email` ON `shares` (`email`,`study_id`);--> statement-breakpoint
CREATE INDEX `studies_owner_newest` ON `studies` (`owner_id`,`deleted_at`,`saved_at`,`id`);--> statement-breakpoint
CREATE INDEX `tokens_account` ON `tokens` (`account_id`,`purpose`);