CREATE TABLE `analysis` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`screen_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`status` enum('queued','running','done','failed') NOT NULL,
	`done` int NOT NULL,
	`total` int NOT NULL,
	`engine` varchar(20) NOT NULL,
	`settings` text NOT NULL,
	`input_sha256` char(64) NOT NULL,
	`requested_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`requested_at` datetime(3) NOT NULL,
	`finished_at` datetime(3),
	`failure` varchar(500),
	CONSTRAINT `analysis_id` PRIMARY KEY(`id`),
	CONSTRAINT `analysis_group` UNIQUE(`group_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `catalyst_result` (
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`analysis_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`catalyst_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`verdict` varchar(20) NOT NULL,
	`result` mediumtext NOT NULL,
	`sparkline` text NOT NULL,
	CONSTRAINT `catalyst_result_analysis_id_catalyst_id_pk` PRIMARY KEY(`analysis_id`,`catalyst_id`)
);
--> statement-breakpoint
CREATE TABLE `well_fit` (
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`analysis_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`well_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`verdict` varchar(20) NOT NULL,
	`result` mediumtext NOT NULL,
	CONSTRAINT `well_fit_analysis_id_well_id_pk` PRIMARY KEY(`analysis_id`,`well_id`)
);
--> statement-breakpoint
CREATE TABLE `campaign` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(160) NOT NULL,
	`reactant` varchar(120) NOT NULL,
	`nu` double NOT NULL,
	`dimension` enum('concentration','pressure','ratio') NOT NULL,
	`reference_temperature_k` double NOT NULL,
	`reference_concentration` double NOT NULL,
	`reference_loading_g_per_l` double NOT NULL,
	`target_conversion` double NOT NULL,
	`conditions` text NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `campaign_id` PRIMARY KEY(`id`),
	CONSTRAINT `campaign_name` UNIQUE(`group_id`,`name`),
	CONSTRAINT `campaign_group` UNIQUE(`group_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `catalyst` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`campaign_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`code` varchar(64) character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`composition` varchar(200),
	`support` varchar(120),
	`metal_loading_percent` double,
	`lot` varchar(60),
	`site_density_mol_per_kg` double,
	`surface_area_m_2_per_g` double,
	`particle_size_um` double,
	`hazards` varchar(500),
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `catalyst_id` PRIMARY KEY(`id`),
	CONSTRAINT `catalyst_code` UNIQUE(`campaign_id`,`code`),
	CONSTRAINT `catalyst_group` UNIQUE(`group_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `candidate_tag` (
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`catalyst_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`tag` varchar(40) character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`tagged_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`tagged_at` datetime(3) NOT NULL,
	CONSTRAINT `candidate_tag_catalyst_id_tag_pk` PRIMARY KEY(`catalyst_id`,`tag`)
);
--> statement-breakpoint
CREATE TABLE `candidate` (
	`catalyst_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`state` enum('open','nominated','scale-up','waiting','set-aside') NOT NULL,
	`version` int NOT NULL,
	CONSTRAINT `candidate_catalyst_id` PRIMARY KEY(`catalyst_id`)
);
--> statement-breakpoint
CREATE TABLE `decision` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`catalyst_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`action` enum('nominate','take-to-scale-up','wait','set-aside','reopen') NOT NULL,
	`from_state` enum('open','nominated','scale-up','waiting','set-aside') NOT NULL,
	`to_state` enum('open','nominated','scale-up','waiting','set-aside') NOT NULL,
	`reason` text NOT NULL,
	`analysis_id` char(36) character set ascii collate ascii_bin,
	`decided_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`decided_at` datetime(3) NOT NULL,
	CONSTRAINT `decision_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `api_token` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`user_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`token_sha256` char(64) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`revoked_at` datetime(3),
	`last_used_at` datetime(3),
	CONSTRAINT `api_token_id` PRIMARY KEY(`id`),
	CONSTRAINT `api_token_tokenSha256_unique` UNIQUE(`token_sha256`)
);
--> statement-breakpoint
CREATE TABLE `audit_event` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`user_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`action` varchar(60) NOT NULL,
	`object_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`detail` varchar(4000) NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `audit_event_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `lab_group` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `lab_group_id` PRIMARY KEY(`id`),
	CONSTRAINT `lab_group_name_unique` UNIQUE(`name`)
);
--> statement-breakpoint
CREATE TABLE `membership` (
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`user_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`role` enum('viewer','analyst','lead','admin') NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `membership_group_id_user_id_pk` PRIMARY KEY(`group_id`,`user_id`)
);
--> statement-breakpoint
CREATE TABLE `session` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`user_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`last_seen_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	CONSTRAINT `session_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `sign_in_failure` (
	`id` int AUTO_INCREMENT NOT NULL,
	`subject` varchar(80) NOT NULL,
	`failed_at` datetime(3) NOT NULL,
	CONSTRAINT `sign_in_failure_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `person` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`email` varchar(254) NOT NULL,
	`name` varchar(120) NOT NULL,
	`password_hash` varchar(255) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `person_id` PRIMARY KEY(`id`),
	CONSTRAINT `person_email_unique` UNIQUE(`email`)
);
--> statement-breakpoint
CREATE TABLE `original` (
	`screen_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`bytes` longblob NOT NULL,
	CONSTRAINT `original_screen_id` PRIMARY KEY(`screen_id`)
);
--> statement-breakpoint
CREATE TABLE `plate` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`screen_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(80) character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`format` smallint NOT NULL,
	CONSTRAINT `plate_id` PRIMARY KEY(`id`),
	CONSTRAINT `plate_name` UNIQUE(`screen_id`,`name`),
	CONSTRAINT `plate_group` UNIQUE(`group_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `screen` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`campaign_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(160) NOT NULL,
	`file_name` varchar(255) NOT NULL,
	`sha256` char(64) NOT NULL,
	`size` int NOT NULL,
	`dimension` enum('concentration','pressure','ratio') NOT NULL,
	`kind` enum('reactant','product','conversion','signal') NOT NULL,
	`reading_unit` varchar(40) NOT NULL,
	`time_unit` varchar(40) NOT NULL,
	`well_count` int NOT NULL,
	`reading_count` int NOT NULL,
	`cautions` longtext NOT NULL,
	`uploaded_by` char(36) character set ascii collate ascii_bin NOT NULL,
	`uploaded_at` datetime(3) NOT NULL,
	CONSTRAINT `screen_id` PRIMARY KEY(`id`),
	CONSTRAINT `screen_file` UNIQUE(`campaign_id`,`sha256`),
	CONSTRAINT `screen_group` UNIQUE(`group_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `well` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`group_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`screen_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`plate_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`ordinal` int NOT NULL,
	`position` varchar(4) NOT NULL,
	`catalyst_id` char(36) character set ascii collate ascii_bin,
	`role` enum('sample','blank','support-blank','control','benchmark') NOT NULL,
	`temperature_k` double NOT NULL,
	`measured_temperature_k` double,
	`mass_g` double,
	`volume_l` double,
	`replicate` smallint,
	`layout_sheet` varchar(255) NOT NULL,
	`layout_cell` varchar(12),
	`reading_count` int NOT NULL,
	`times_s` mediumblob NOT NULL,
	`readings` mediumblob NOT NULL,
	`reading_rows` mediumblob NOT NULL,
	`reading_sheet` varchar(255) NOT NULL,
	`reading_column` varchar(4) NOT NULL,
	CONSTRAINT `well_id` PRIMARY KEY(`id`),
	CONSTRAINT `well_group` UNIQUE(`group_id`,`id`),
	CONSTRAINT `well_place` UNIQUE(`plate_id`,`position`)
);
--> statement-breakpoint
ALTER TABLE `analysis` ADD CONSTRAINT `analysis_requested_by_person_id_fk` FOREIGN KEY (`requested_by`) REFERENCES `person`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `analysis` ADD CONSTRAINT `analysis_screen` FOREIGN KEY (`group_id`,`screen_id`) REFERENCES `screen`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `catalyst_result` ADD CONSTRAINT `catalyst_result_analysis` FOREIGN KEY (`group_id`,`analysis_id`) REFERENCES `analysis`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `catalyst_result` ADD CONSTRAINT `catalyst_result_catalyst` FOREIGN KEY (`group_id`,`catalyst_id`) REFERENCES `catalyst`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `well_fit` ADD CONSTRAINT `well_fit_analysis` FOREIGN KEY (`group_id`,`analysis_id`) REFERENCES `analysis`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `well_fit` ADD CONSTRAINT `well_fit_well` FOREIGN KEY (`group_id`,`well_id`) REFERENCES `well`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `campaign` ADD CONSTRAINT `campaign_group_id_lab_group_id_fk` FOREIGN KEY (`group_id`) REFERENCES `lab_group`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `catalyst` ADD CONSTRAINT `catalyst_campaign` FOREIGN KEY (`group_id`,`campaign_id`) REFERENCES `campaign`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `candidate_tag` ADD CONSTRAINT `candidate_tag_tagged_by_person_id_fk` FOREIGN KEY (`tagged_by`) REFERENCES `person`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `candidate_tag` ADD CONSTRAINT `candidate_tag_catalyst` FOREIGN KEY (`group_id`,`catalyst_id`) REFERENCES `catalyst`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `candidate` ADD CONSTRAINT `candidate_catalyst` FOREIGN KEY (`group_id`,`catalyst_id`) REFERENCES `catalyst`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `decision` ADD CONSTRAINT `decision_decided_by_person_id_fk` FOREIGN KEY (`decided_by`) REFERENCES `person`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `decision` ADD CONSTRAINT `decision_catalyst` FOREIGN KEY (`group_id`,`catalyst_id`) REFERENCES `catalyst`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `decision` ADD CONSTRAINT `decision_analysis` FOREIGN KEY (`group_id`,`analysis_id`) REFERENCES `analysis`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `api_token` ADD CONSTRAINT `api_token_membership` FOREIGN KEY (`group_id`,`user_id`) REFERENCES `membership`(`group_id`,`user_id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `audit_event` ADD CONSTRAINT `audit_event_group_id_lab_group_id_fk` FOREIGN KEY (`group_id`) REFERENCES `lab_group`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `audit_event` ADD CONSTRAINT `audit_event_user_id_person_id_fk` FOREIGN KEY (`user_id`) REFERENCES `person`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `membership` ADD CONSTRAINT `membership_group_id_lab_group_id_fk` FOREIGN KEY (`group_id`) REFERENCES `lab_group`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `membership` ADD CONSTRAINT `membership_user_id_person_id_fk` FOREIGN KEY (`user_id`) REFERENCES `person`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `session` ADD CONSTRAINT `session_user_id_person_id_fk` FOREIGN KEY (`user_id`) REFERENCES `person`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `original` ADD CONSTRAINT `original_screen` FOREIGN KEY (`group_id`,`screen_id`) REFERENCES `screen`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `plate` ADD CONSTRAINT `plate_screen` FOREIGN KEY (`group_id`,`screen_id`) REFERENCES `screen`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `screen` ADD CONSTRAINT `screen_uploaded_by_person_id_fk` FOREIGN KEY (`uploaded_by`) REFERENCES `person`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `screen` ADD CONSTRAINT `screen_campaign` FOREIGN KEY (`group_id`,`campaign_id`) REFERENCES `campaign`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `well` ADD CONSTRAINT `well_screen` FOREIGN KEY (`group_id`,`screen_id`) REFERENCES `screen`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `well` ADD CONSTRAINT `well_plate` FOREIGN KEY (`group_id`,`plate_id`) REFERENCES `plate`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `well` ADD CONSTRAINT `well_catalyst` FOREIGN KEY (`group_id`,`catalyst_id`) REFERENCES `catalyst`(`group_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `analysis_screen_time` ON `analysis` (`screen_id`,`requested_at`);--> statement-breakpoint
CREATE INDEX `decision_time` ON `decision` (`catalyst_id`,`decided_at`);--> statement-breakpoint
CREATE INDEX `audit_event_group` ON `audit_event` (`group_id`,`at`);--> statement-breakpoint
CREATE INDEX `membership_user` ON `membership` (`user_id`);--> statement-breakpoint
CREATE INDEX `session_user` ON `session` (`user_id`);--> statement-breakpoint
CREATE INDEX `sign_in_failure_subject` ON `sign_in_failure` (`subject`,`failed_at`);