CREATE TABLE `cords` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`a_plate_id` varchar(64) character set ascii collate ascii_bin,
	`a_jack_id` varchar(64) character set ascii collate ascii_bin,
	`a_device_id` varchar(64) character set ascii collate ascii_bin,
	`a_terminal` varchar(24) character set ascii collate ascii_bin,
	`b_plate_id` varchar(64) character set ascii collate ascii_bin,
	`b_jack_id` varchar(64) character set ascii collate ascii_bin,
	`b_device_id` varchar(64) character set ascii collate ascii_bin,
	`b_terminal` varchar(24) character set ascii collate ascii_bin,
	`form` enum('patch cord','jumper','lead') NOT NULL,
	`length_mm` int NOT NULL,
	CONSTRAINT `cords_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `cords_seq` UNIQUE(`seq`),
	CONSTRAINT `cords_a_one_end` CHECK((`cords`.`a_jack_id` is not null) + (`cords`.`a_device_id` is not null) = 1),
	CONSTRAINT `cords_b_one_end` CHECK((`cords`.`b_jack_id` is not null) + (`cords`.`b_device_id` is not null) = 1)
);
--> statement-breakpoint
CREATE TABLE `devices` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`model_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`plate_id` varchar(64) character set ascii collate ascii_bin,
	`rack_id` varchar(64) character set ascii collate ascii_bin,
	`unit` int,
	`room_id` varchar(64) character set ascii collate ascii_bin,
	`at_x_mm` int,
	`at_y_mm` int,
	`height_mm` int,
	`name` varchar(80) NOT NULL,
	`code` varchar(32) character set ascii collate ascii_general_ci,
	`supplied_by` enum('us','owner','other') NOT NULL,
	`load_ohm` double,
	`tap_w` double,
	`video_format` enum('1080p60','2160p30','2160p60-420','2160p60','4320p60'),
	`zones` json NOT NULL,
	CONSTRAINT `devices_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `devices_seq` UNIQUE(`seq`),
	CONSTRAINT `devices_code` UNIQUE(`company_id`,`job_id`,`code`),
	CONSTRAINT `devices_one_place` CHECK((`devices`.`plate_id` is not null) + (`devices`.`rack_id` is not null) + (`devices`.`room_id` is not null) = 1)
);
--> statement-breakpoint
CREATE TABLE `run_pathways` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`run_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`ordinal` int NOT NULL,
	`pathway_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `run_pathways_company_id_job_id_run_id_ordinal_pk` PRIMARY KEY(`company_id`,`job_id`,`run_id`,`ordinal`)
);
--> statement-breakpoint
CREATE TABLE `runs` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`serial` bigint NOT NULL,
	`cable_type_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`a_plate_id` varchar(64) character set ascii collate ascii_bin,
	`a_jack_id` varchar(64) character set ascii collate ascii_bin,
	`a_device_id` varchar(64) character set ascii collate ascii_bin,
	`a_terminal` varchar(24) character set ascii collate ascii_bin,
	`a_rack_id` varchar(64) character set ascii collate ascii_bin,
	`b_plate_id` varchar(64) character set ascii collate ascii_bin,
	`b_jack_id` varchar(64) character set ascii collate ascii_bin,
	`b_device_id` varchar(64) character set ascii collate ascii_bin,
	`b_terminal` varchar(24) character set ascii collate ascii_bin,
	`b_rack_id` varchar(64) character set ascii collate ascii_bin,
	`label` varchar(32) character set ascii collate ascii_general_ci NOT NULL,
	`purpose` varchar(60) NOT NULL,
	`bundle` varchar(12),
	`route` enum('overhead','underfloor'),
	`slack_a_mm` int,
	`slack_b_mm` int,
	`stated_length_mm` int,
	`load_join` enum('parallel','series') NOT NULL,
	`dropped` varchar(200),
	CONSTRAINT `runs_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `runs_seq` UNIQUE(`seq`),
	CONSTRAINT `runs_label` UNIQUE(`company_id`,`job_id`,`label`),
	CONSTRAINT `runs_serial` UNIQUE(`company_id`,`job_id`,`serial`),
	CONSTRAINT `runs_a_one_end` CHECK((`runs`.`a_plate_id` is not null) + (`runs`.`a_device_id` is not null) + (`runs`.`a_rack_id` is not null) <= 1),
	CONSTRAINT `runs_b_one_end` CHECK((`runs`.`b_plate_id` is not null) + (`runs`.`b_device_id` is not null) + (`runs`.`b_rack_id` is not null) <= 1)
);
--> statement-breakpoint
CREATE TABLE `companies` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(80) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	`length_unit` enum('ft','m') NOT NULL,
	`conductor_unit` enum('awg','mm2') NOT NULL,
	`label_pattern` varchar(60) NOT NULL,
	`slack_rack_mm` int NOT NULL,
	`slack_plate_mm` int NOT NULL,
	`limits` json NOT NULL,
	CONSTRAINT `companies_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `members` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(80) NOT NULL,
	`email` varchar(200) NOT NULL,
	`role` enum('owner','office','designer','lead','technician') NOT NULL,
	`passphrase_hash` varchar(80) NOT NULL,
	`disabled` boolean NOT NULL DEFAULT false,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `members_company_id_id_pk` PRIMARY KEY(`company_id`,`id`),
	CONSTRAINT `members_email` UNIQUE(`email`)
);
--> statement-breakpoint
CREATE TABLE `job_log` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`version` int NOT NULL,
	`command_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`actor_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`verb` varchar(40) NOT NULL,
	`label` varchar(300) NOT NULL,
	`args` json NOT NULL,
	`change` json NOT NULL,
	`made_at` int NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `job_log_company_id_job_id_version_pk` PRIMARY KEY(`company_id`,`job_id`,`version`),
	CONSTRAINT `job_log_command` UNIQUE(`company_id`,`job_id`,`command_id`)
);
--> statement-breakpoint
CREATE TABLE `jobs` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`version` int NOT NULL DEFAULT 0,
	`created_at` datetime(3) NOT NULL,
	`created_by_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(80) NOT NULL,
	`client` varchar(80) NOT NULL,
	`address` varchar(160) NOT NULL,
	`length_unit` enum('ft','m') NOT NULL,
	`conductor_unit` enum('awg','mm2') NOT NULL,
	`label_pattern` varchar(60) NOT NULL,
	`slack_rack_mm` int NOT NULL,
	`slack_plate_mm` int NOT NULL,
	`limits` json NOT NULL,
	CONSTRAINT `jobs_company_id_id_pk` PRIMARY KEY(`company_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `cable_types` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`catalog_id` varchar(64) character set ascii collate ascii_bin,
	`catalog_version` int,
	`code` varchar(32) character set ascii collate ascii_general_ci NOT NULL,
	`name` varchar(80) NOT NULL,
	`family` enum('speaker','twisted-pair','coax','line','control','fibre','video','usb') NOT NULL,
	`label_kind` varchar(2) NOT NULL,
	`conductors` int NOT NULL,
	`awg` double,
	`area_mm2` double,
	`stranding` enum('solid','stranded','class5') NOT NULL,
	`material` enum('copper','cca') NOT NULL,
	`resistance_ohm_per_km` double,
	`category` enum('5e','6','6A','7A','8'),
	`jacket_rating` enum('CMP','CMR','CMG','CM','CMX','CL3P','CL3R','CL3','CL3X','CL2P','CL2R','CL2','CL2X','CATVP','CATVR','CATV','CATVX','OFNP','OFNR','OFNG','OFN','OFCP','OFCR','OFCG','OFC','FPLP','FPLR','FPL','none') NOT NULL,
	`wet` boolean NOT NULL,
	`outdoor` boolean NOT NULL,
	`buried` boolean NOT NULL,
	`outer_diameter_um` int NOT NULL,
	`jacket_colour` enum('white','slate','black','blue','yellow','aqua','grey','beige','brown','green','orange','purple') NOT NULL,
	`put_ups` json NOT NULL,
	CONSTRAINT `cable_types_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `cable_types_seq` UNIQUE(`seq`),
	CONSTRAINT `cable_types_code` UNIQUE(`company_id`,`job_id`,`code`)
);
--> statement-breakpoint
CREATE TABLE `catalog_cable_types` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`version` int NOT NULL,
	`code` varchar(32) character set ascii collate ascii_general_ci NOT NULL,
	`name` varchar(80) NOT NULL,
	`family` enum('speaker','twisted-pair','coax','line','control','fibre','video','usb') NOT NULL,
	`label_kind` varchar(2) NOT NULL,
	`conductors` int NOT NULL,
	`awg` double,
	`area_mm2` double,
	`stranding` enum('solid','stranded','class5') NOT NULL,
	`material` enum('copper','cca') NOT NULL,
	`resistance_ohm_per_km` double,
	`category` enum('5e','6','6A','7A','8'),
	`jacket_rating` enum('CMP','CMR','CMG','CM','CMX','CL3P','CL3R','CL3','CL3X','CL2P','CL2R','CL2','CL2X','CATVP','CATVR','CATV','CATVX','OFNP','OFNR','OFNG','OFN','OFCP','OFCR','OFCG','OFC','FPLP','FPLR','FPL','none') NOT NULL,
	`wet` boolean NOT NULL,
	`outdoor` boolean NOT NULL,
	`buried` boolean NOT NULL,
	`outer_diameter_um` int NOT NULL,
	`jacket_colour` enum('white','slate','black','blue','yellow','aqua','grey','beige','brown','green','orange','purple') NOT NULL,
	`put_ups` json NOT NULL,
	CONSTRAINT `catalog_cable_types_company_id_id_pk` PRIMARY KEY(`company_id`,`id`),
	CONSTRAINT `catalog_cable_types_code` UNIQUE(`company_id`,`code`)
);
--> statement-breakpoint
CREATE TABLE `catalog_device_models` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`version` int NOT NULL,
	`name` varchar(80) NOT NULL,
	`category` enum('panel','amplifier','receiver','source','switch','speaker','subwoofer','display','extender','access-point','camera','keypad','volume-control','sensor','shade','processor','service','other') NOT NULL,
	`rack_units` int NOT NULL,
	`terminals` json NOT NULL,
	`passes` json NOT NULL,
	`shared_power_w` double,
	CONSTRAINT `catalog_device_models_company_id_id_pk` PRIMARY KEY(`company_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `device_models` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`catalog_id` varchar(64) character set ascii collate ascii_bin,
	`catalog_version` int,
	`name` varchar(80) NOT NULL,
	`category` enum('panel','amplifier','receiver','source','switch','speaker','subwoofer','display','extender','access-point','camera','keypad','volume-control','sensor','shade','processor','service','other') NOT NULL,
	`rack_units` int NOT NULL,
	`terminals` json NOT NULL,
	`passes` json NOT NULL,
	`shared_power_w` double,
	CONSTRAINT `device_models_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `device_models_seq` UNIQUE(`seq`)
);
--> statement-breakpoint
CREATE TABLE `levels` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`name` varchar(80) NOT NULL,
	`code` varchar(32) character set ascii collate ascii_general_ci NOT NULL,
	`use` enum('living','attic','crawl','basement','outside') NOT NULL,
	`elevation_mm` int NOT NULL,
	`ceiling_height_mm` int NOT NULL,
	CONSTRAINT `levels_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `levels_seq` UNIQUE(`seq`),
	CONSTRAINT `levels_code` UNIQUE(`company_id`,`job_id`,`code`)
);
--> statement-breakpoint
CREATE TABLE `pathways` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`name` varchar(80) NOT NULL,
	`form` enum('chase') NOT NULL,
	`at_x_mm` int NOT NULL,
	`at_y_mm` int NOT NULL,
	`bottom_level_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`top_level_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `pathways_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `pathways_seq` UNIQUE(`seq`)
);
--> statement-breakpoint
CREATE TABLE `plate_jacks` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`plate_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`ordinal` int NOT NULL,
	`position` int NOT NULL,
	`connector` enum('modular','coax','speaker-pair','fibre','control','power','keypad','line','hdmi','usb','bare') NOT NULL,
	CONSTRAINT `plate_jacks_company_id_job_id_plate_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`plate_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `plates` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`room_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`number` bigint NOT NULL,
	`name` varchar(80) NOT NULL,
	`form` enum('wall-box','ceiling-opening','floor-box','exterior-box','stub') NOT NULL,
	`mounting` enum('wall','ceiling','floor','outside') NOT NULL,
	`wall` int,
	`along_mm` int,
	`at_x_mm` int,
	`at_y_mm` int,
	`height_mm` int NOT NULL,
	`height_to` enum('centre','bottom') NOT NULL,
	`gangs` int NOT NULL,
	CONSTRAINT `plates_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `plates_seq` UNIQUE(`seq`),
	CONSTRAINT `plates_number` UNIQUE(`company_id`,`job_id`,`room_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `racks` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`room_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(80) NOT NULL,
	`code` varchar(32) character set ascii collate ascii_general_ci NOT NULL,
	`units` int NOT NULL,
	`at_x_mm` int NOT NULL,
	`at_y_mm` int NOT NULL,
	CONSTRAINT `racks_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `racks_seq` UNIQUE(`seq`),
	CONSTRAINT `racks_code` UNIQUE(`company_id`,`job_id`,`code`)
);
--> statement-breakpoint
CREATE TABLE `rooms` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`level_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(80) NOT NULL,
	`code` varchar(32) character set ascii collate ascii_general_ci NOT NULL,
	`aliases` json NOT NULL,
	`outline` json NOT NULL,
	`ceiling_height_mm` int,
	`space_class` enum('general','riser','plenum','wet','outdoor','buried') NOT NULL,
	CONSTRAINT `rooms_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `rooms_seq` UNIQUE(`seq`),
	CONSTRAINT `rooms_code` UNIQUE(`company_id`,`job_id`,`code`)
);
--> statement-breakpoint
CREATE TABLE `acceptances` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`at` datetime(3) NOT NULL,
	`by_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`check` varchar(40) NOT NULL,
	`about_kind` varchar(20) NOT NULL,
	`about_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`figures` varchar(400) NOT NULL,
	`reason` varchar(500) NOT NULL,
	CONSTRAINT `acceptances_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `acceptances_seq` UNIQUE(`seq`)
);
--> statement-breakpoint
CREATE TABLE `label_prints` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`at` datetime(3) NOT NULL,
	`by_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`run_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`end` enum('a','b') NOT NULL,
	`text` varchar(24) NOT NULL,
	`copies` int NOT NULL,
	`stock` varchar(40) NOT NULL,
	CONSTRAINT `label_prints_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `label_prints_seq` UNIQUE(`seq`)
);
--> statement-breakpoint
CREATE TABLE `pulls` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`at` datetime(3) NOT NULL,
	`by_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`run_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`mark_a` int,
	`mark_b` int,
	`mark_unit` enum('ft','m') NOT NULL,
	`spool` varchar(24),
	CONSTRAINT `pulls_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `pulls_seq` UNIQUE(`seq`)
);
--> statement-breakpoint
CREATE TABLE `strikes` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`at` datetime(3) NOT NULL,
	`by_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`label_print_id` varchar(64) character set ascii collate ascii_bin,
	`pull_id` varchar(64) character set ascii collate ascii_bin,
	`termination_id` varchar(64) character set ascii collate ascii_bin,
	`test_id` varchar(64) character set ascii collate ascii_bin,
	`acceptance_id` varchar(64) character set ascii collate ascii_bin,
	`strike_id` varchar(64) character set ascii collate ascii_bin,
	`reason` varchar(200) NOT NULL,
	CONSTRAINT `strikes_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `strikes_seq` UNIQUE(`seq`),
	CONSTRAINT `strikes_one_target` CHECK((`strikes`.`label_print_id` is not null) + (`strikes`.`pull_id` is not null) + (`strikes`.`termination_id` is not null) + (`strikes`.`test_id` is not null) + (`strikes`.`acceptance_id` is not null) + (`strikes`.`strike_id` is not null) = 1)
);
--> statement-breakpoint
CREATE TABLE `terminations` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`at` datetime(3) NOT NULL,
	`by_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`run_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`end` enum('a','b') NOT NULL,
	`scheme` varchar(40) NOT NULL,
	CONSTRAINT `terminations_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `terminations_seq` UNIQUE(`seq`)
);
--> statement-breakpoint
CREATE TABLE `tests` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`job_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` bigint unsigned AUTO_INCREMENT NOT NULL,
	`at` datetime(3) NOT NULL,
	`by_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`run_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`test_kind` enum('wire map','qualification','certification','polarity','continuity','signal','loop resistance') NOT NULL,
	`result` enum('pass','fail') NOT NULL,
	`reading` varchar(80) NOT NULL,
	CONSTRAINT `tests_company_id_job_id_id_pk` PRIMARY KEY(`company_id`,`job_id`,`id`),
	CONSTRAINT `tests_seq` UNIQUE(`seq`)
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`id_hash` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`company_id` varchar(64) character set ascii collate ascii_bin,
	`member_id` varchar(64) character set ascii collate ascii_bin,
	`data` text NOT NULL,
	`created_at` bigint NOT NULL,
	`idle_until` bigint NOT NULL,
	CONSTRAINT `sessions_id_hash` PRIMARY KEY(`id_hash`)
);
--> statement-breakpoint
CREATE TABLE `sign_in_attempts` (
	`subject` varchar(80) NOT NULL,
	`attempts` int NOT NULL,
	`window_ends` bigint NOT NULL,
	CONSTRAINT `sign_in_attempts_subject` PRIMARY KEY(`subject`)
);
--> statement-breakpoint
ALTER TABLE `cords` ADD CONSTRAINT `cords_a_jack` FOREIGN KEY (`company_id`,`job_id`,`a_plate_id`,`a_jack_id`) REFERENCES `plate_jacks`(`company_id`,`job_id`,`plate_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cords` ADD CONSTRAINT `cords_a_device` FOREIGN KEY (`company_id`,`job_id`,`a_device_id`) REFERENCES `devices`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cords` ADD CONSTRAINT `cords_b_jack` FOREIGN KEY (`company_id`,`job_id`,`b_plate_id`,`b_jack_id`) REFERENCES `plate_jacks`(`company_id`,`job_id`,`plate_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cords` ADD CONSTRAINT `cords_b_device` FOREIGN KEY (`company_id`,`job_id`,`b_device_id`) REFERENCES `devices`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `devices` ADD CONSTRAINT `devices_model` FOREIGN KEY (`company_id`,`job_id`,`model_id`) REFERENCES `device_models`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `devices` ADD CONSTRAINT `devices_plate` FOREIGN KEY (`company_id`,`job_id`,`plate_id`) REFERENCES `plates`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `devices` ADD CONSTRAINT `devices_rack` FOREIGN KEY (`company_id`,`job_id`,`rack_id`) REFERENCES `racks`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `devices` ADD CONSTRAINT `devices_room` FOREIGN KEY (`company_id`,`job_id`,`room_id`) REFERENCES `rooms`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `run_pathways` ADD CONSTRAINT `run_pathways_run` FOREIGN KEY (`company_id`,`job_id`,`run_id`) REFERENCES `runs`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `run_pathways` ADD CONSTRAINT `run_pathways_pathway` FOREIGN KEY (`company_id`,`job_id`,`pathway_id`) REFERENCES `pathways`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `runs` ADD CONSTRAINT `runs_cable_type` FOREIGN KEY (`company_id`,`job_id`,`cable_type_id`) REFERENCES `cable_types`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `runs` ADD CONSTRAINT `runs_a_plate` FOREIGN KEY (`company_id`,`job_id`,`a_plate_id`) REFERENCES `plates`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `runs` ADD CONSTRAINT `runs_a_jack` FOREIGN KEY (`company_id`,`job_id`,`a_plate_id`,`a_jack_id`) REFERENCES `plate_jacks`(`company_id`,`job_id`,`plate_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `runs` ADD CONSTRAINT `runs_a_device` FOREIGN KEY (`company_id`,`job_id`,`a_device_id`) REFERENCES `devices`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `runs` ADD CONSTRAINT `runs_a_rack` FOREIGN KEY (`company_id`,`job_id`,`a_rack_id`) REFERENCES `racks`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `runs` ADD CONSTRAINT `runs_b_plate` FOREIGN KEY (`company_id`,`job_id`,`b_plate_id`) REFERENCES `plates`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `runs` ADD CONSTRAINT `runs_b_jack` FOREIGN KEY (`company_id`,`job_id`,`b_plate_id`,`b_jack_id`) REFERENCES `plate_jacks`(`company_id`,`job_id`,`plate_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `runs` ADD CONSTRAINT `runs_b_device` FOREIGN KEY (`company_id`,`job_id`,`b_device_id`) REFERENCES `devices`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `runs` ADD CONSTRAINT `runs_b_rack` FOREIGN KEY (`company_id`,`job_id`,`b_rack_id`) REFERENCES `racks`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `members` ADD CONSTRAINT `members_company` FOREIGN KEY (`company_id`) REFERENCES `companies`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `job_log` ADD CONSTRAINT `job_log_job` FOREIGN KEY (`company_id`,`job_id`) REFERENCES `jobs`(`company_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `job_log` ADD CONSTRAINT `job_log_member` FOREIGN KEY (`company_id`,`actor_id`) REFERENCES `members`(`company_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `jobs` ADD CONSTRAINT `jobs_company` FOREIGN KEY (`company_id`) REFERENCES `companies`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `jobs` ADD CONSTRAINT `jobs_member` FOREIGN KEY (`company_id`,`created_by_id`) REFERENCES `members`(`company_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cable_types` ADD CONSTRAINT `cable_types_job` FOREIGN KEY (`company_id`,`job_id`) REFERENCES `jobs`(`company_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `catalog_cable_types` ADD CONSTRAINT `catalog_cable_types_company` FOREIGN KEY (`company_id`) REFERENCES `companies`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `catalog_device_models` ADD CONSTRAINT `catalog_device_models_company` FOREIGN KEY (`company_id`) REFERENCES `companies`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `device_models` ADD CONSTRAINT `device_models_job` FOREIGN KEY (`company_id`,`job_id`) REFERENCES `jobs`(`company_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `levels` ADD CONSTRAINT `levels_job` FOREIGN KEY (`company_id`,`job_id`) REFERENCES `jobs`(`company_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `pathways` ADD CONSTRAINT `pathways_bottom` FOREIGN KEY (`company_id`,`job_id`,`bottom_level_id`) REFERENCES `levels`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `pathways` ADD CONSTRAINT `pathways_top` FOREIGN KEY (`company_id`,`job_id`,`top_level_id`) REFERENCES `levels`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `plate_jacks` ADD CONSTRAINT `plate_jacks_plate` FOREIGN KEY (`company_id`,`job_id`,`plate_id`) REFERENCES `plates`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `plates` ADD CONSTRAINT `plates_room` FOREIGN KEY (`company_id`,`job_id`,`room_id`) REFERENCES `rooms`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `racks` ADD CONSTRAINT `racks_room` FOREIGN KEY (`company_id`,`job_id`,`room_id`) REFERENCES `rooms`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `rooms` ADD CONSTRAINT `rooms_level` FOREIGN KEY (`company_id`,`job_id`,`level_id`) REFERENCES `levels`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `acceptances` ADD CONSTRAINT `acceptances_job` FOREIGN KEY (`company_id`,`job_id`) REFERENCES `jobs`(`company_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `acceptances` ADD CONSTRAINT `acceptances_member` FOREIGN KEY (`company_id`,`by_id`) REFERENCES `members`(`company_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `label_prints` ADD CONSTRAINT `label_prints_run` FOREIGN KEY (`company_id`,`job_id`,`run_id`) REFERENCES `runs`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `label_prints` ADD CONSTRAINT `label_prints_member` FOREIGN KEY (`company_id`,`by_id`) REFERENCES `members`(`company_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `pulls` ADD CONSTRAINT `pulls_run` FOREIGN KEY (`company_id`,`job_id`,`run_id`) REFERENCES `runs`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `pulls` ADD CONSTRAINT `pulls_member` FOREIGN KEY (`company_id`,`by_id`) REFERENCES `members`(`company_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `strikes` ADD CONSTRAINT `strikes_member` FOREIGN KEY (`company_id`,`by_id`) REFERENCES `members`(`company_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `strikes` ADD CONSTRAINT `strikes_label_print` FOREIGN KEY (`company_id`,`job_id`,`label_print_id`) REFERENCES `label_prints`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `strikes` ADD CONSTRAINT `strikes_pull` FOREIGN KEY (`company_id`,`job_id`,`pull_id`) REFERENCES `pulls`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `strikes` ADD CONSTRAINT `strikes_termination` FOREIGN KEY (`company_id`,`job_id`,`termination_id`) REFERENCES `terminations`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `strikes` ADD CONSTRAINT `strikes_test` FOREIGN KEY (`company_id`,`job_id`,`test_id`) REFERENCES `tests`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `strikes` ADD CONSTRAINT `strikes_acceptance` FOREIGN KEY (`company_id`,`job_id`,`acceptance_id`) REFERENCES `acceptances`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `strikes` ADD CONSTRAINT `strikes_strike` FOREIGN KEY (`company_id`,`job_id`,`strike_id`) REFERENCES `strikes`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `terminations` ADD CONSTRAINT `terminations_run` FOREIGN KEY (`company_id`,`job_id`,`run_id`) REFERENCES `runs`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `terminations` ADD CONSTRAINT `terminations_member` FOREIGN KEY (`company_id`,`by_id`) REFERENCES `members`(`company_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `tests` ADD CONSTRAINT `tests_run` FOREIGN KEY (`company_id`,`job_id`,`run_id`) REFERENCES `runs`(`company_id`,`job_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `tests` ADD CONSTRAINT `tests_member` FOREIGN KEY (`company_id`,`by_id`) REFERENCES `members`(`company_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `job_log_actor` ON `job_log` (`company_id`,`actor_id`);--> statement-breakpoint
CREATE INDEX `sessions_member` ON `sessions` (`company_id`,`member_id`);--> statement-breakpoint
CREATE INDEX `sessions_idle` ON `sessions` (`idle_until`);