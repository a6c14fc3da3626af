CREATE TABLE `board` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`tag_number` int NOT NULL,
	`state` varchar(8) NOT NULL,
	`species` varchar(80) NOT NULL,
	`cut` varchar(8) NOT NULL,
	`nominal_quarters` smallint,
	`thickness_um` int NOT NULL,
	`length_um` int NOT NULL,
	`width_um` int NOT NULL,
	`moisture_tenths` smallint,
	`place` varchar(80) NOT NULL,
	`source` varchar(120) NOT NULL,
	`cost_minor` int,
	`note` text NOT NULL,
	`revision` int NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `board_id` PRIMARY KEY(`id`),
	CONSTRAINT `board_tag` UNIQUE(`shop_id`,`tag_number`)
);
--> statement-breakpoint
CREATE TABLE `moisture_reading` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`board_id` char(36) NOT NULL,
	`tenths` smallint NOT NULL,
	`taken_on` date NOT NULL,
	`taken_by` char(36) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `moisture_reading_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `history` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`at` datetime(3) NOT NULL,
	`user_id` char(36),
	`noun` varchar(24) NOT NULL,
	`noun_id` char(36) NOT NULL,
	`verb` varchar(32) NOT NULL,
	`detail` json NOT NULL,
	CONSTRAINT `history_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `face` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`job_id` char(36) NOT NULL,
	`title` varchar(120) NOT NULL,
	`position` int NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `face_id` PRIMARY KEY(`id`),
	CONSTRAINT `face_position` UNIQUE(`job_id`,`position`)
);
--> statement-breakpoint
CREATE TABLE `job` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`number` int NOT NULL,
	`title` varchar(120) NOT NULL,
	`client` varchar(120) NOT NULL,
	`note` text NOT NULL,
	`due_on` date,
	`state` varchar(8) NOT NULL,
	`revision` int NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `job_id` PRIMARY KEY(`id`),
	CONSTRAINT `job_number` UNIQUE(`shop_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `layout` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`face_id` char(36) NOT NULL,
	`document` json NOT NULL,
	`crosscut_saw_id` char(36),
	`rip_saw_id` char(36),
	`revision` int NOT NULL,
	`updated_by` char(36) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `layout_id` PRIMARY KEY(`id`),
	CONSTRAINT `layout_face` UNIQUE(`face_id`)
);
--> statement-breakpoint
CREATE TABLE `layout_board` (
	`layout_id` char(36) NOT NULL,
	`board_id` char(36) NOT NULL,
	`straightening_id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	CONSTRAINT `layout_board_layout_id_board_id_pk` PRIMARY KEY(`layout_id`,`board_id`)
);
--> statement-breakpoint
CREATE TABLE `cut_order` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`number` int NOT NULL,
	`job_id` char(36) NOT NULL,
	`state` varchar(12) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `cut_order_id` PRIMARY KEY(`id`),
	CONSTRAINT `cut_order_number` UNIQUE(`shop_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `cut_order_face` (
	`order_id` char(36) NOT NULL,
	`face_id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	CONSTRAINT `cut_order_face_order_id_face_id_pk` PRIMARY KEY(`order_id`,`face_id`)
);
--> statement-breakpoint
CREATE TABLE `order_revision` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`order_id` char(36) NOT NULL,
	`revision` int NOT NULL,
	`snapshot` json NOT NULL,
	`fingerprint` char(64) NOT NULL,
	`issued_by` char(36) NOT NULL,
	`issued_at` datetime(3) NOT NULL,
	`superseded_at` datetime(3),
	CONSTRAINT `order_revision_id` PRIMARY KEY(`id`),
	CONSTRAINT `order_revision_number` UNIQUE(`order_id`,`revision`)
);
--> statement-breakpoint
CREATE TABLE `step_tick` (
	`revision_id` char(36) NOT NULL,
	`step_id` varchar(40) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`ticked_by` char(36) NOT NULL,
	`ticked_at` datetime(3) NOT NULL,
	CONSTRAINT `step_tick_revision_id_step_id_pk` PRIMARY KEY(`revision_id`,`step_id`)
);
--> statement-breakpoint
CREATE TABLE `photo` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`upload_key` varchar(64) NOT NULL,
	`file_name` varchar(255) NOT NULL,
	`sha256` char(64) NOT NULL,
	`kind` varchar(8) NOT NULL,
	`bytes` int NOT NULL,
	`width_px` int NOT NULL,
	`height_px` int NOT NULL,
	`taken_at` datetime(3),
	`camera` varchar(120),
	`focal_length_hundredths` int,
	`original_key` varchar(200) NOT NULL,
	`levels` json NOT NULL,
	`uploaded_by` char(36) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `photo_id` PRIMARY KEY(`id`),
	CONSTRAINT `photo_upload` UNIQUE(`shop_id`,`upload_key`)
);
--> statement-breakpoint
CREATE TABLE `rate_limit` (
	`key` varchar(255) NOT NULL,
	`points` int NOT NULL DEFAULT 0,
	`expire` bigint unsigned,
	CONSTRAINT `rate_limit_key` PRIMARY KEY(`key`)
);
--> statement-breakpoint
CREATE TABLE `session` (
	`id` char(36) NOT NULL,
	`user_id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`device` varchar(200) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	CONSTRAINT `session_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `saw` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`name` varchar(80) NOT NULL,
	`kind` varchar(8) NOT NULL,
	`kerf_um` int NOT NULL,
	`clean_up_um` int NOT NULL,
	CONSTRAINT `saw_id` PRIMARY KEY(`id`),
	CONSTRAINT `saw_shop_name` UNIQUE(`shop_id`,`name`)
);
--> statement-breakpoint
CREATE TABLE `shop` (
	`id` char(36) NOT NULL,
	`name` varchar(120) NOT NULL,
	`units` varchar(8) NOT NULL,
	`inch_fraction` smallint NOT NULL,
	`time_zone` varchar(64) NOT NULL,
	`paper` varchar(8) NOT NULL,
	`currency` char(3) NOT NULL,
	`shortest_crosscut_um` int NOT NULL,
	`narrowest_rip_um` int NOT NULL,
	`shortest_machined_um` int NOT NULL,
	`offcut_length_um` int NOT NULL,
	`offcut_width_um` int NOT NULL,
	`next_board_number` int NOT NULL,
	`next_job_number` int NOT NULL,
	`next_order_number` int NOT NULL,
	`revision` int NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `shop_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `board_picture` (
	`board_id` char(36) NOT NULL,
	`straightening_id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	CONSTRAINT `board_picture_board_id` PRIMARY KEY(`board_id`)
);
--> statement-breakpoint
CREATE TABLE `keep_clear` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`straightening_id` char(36) NOT NULL,
	`kind` varchar(8) NOT NULL,
	`area` json NOT NULL,
	`note` varchar(200) NOT NULL,
	CONSTRAINT `keep_clear_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `straightening` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`board_id` char(36) NOT NULL,
	`photo_id` char(36) NOT NULL,
	`version` int NOT NULL,
	`marking` json NOT NULL,
	`state` varchar(12) NOT NULL,
	`failure` text,
	`length_um` int NOT NULL,
	`width_um` int NOT NULL,
	`px_per_mm` double NOT NULL,
	`levels` json NOT NULL,
	`residual_um` int,
	`outline` json,
	`zones_revision` int NOT NULL,
	`task_id` char(36),
	`created_by` char(36) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `straightening_id` PRIMARY KEY(`id`),
	CONSTRAINT `straightening_version` UNIQUE(`board_id`,`version`)
);
--> statement-breakpoint
CREATE TABLE `task` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`kind` varchar(24) NOT NULL,
	`payload` json NOT NULL,
	`state` varchar(12) NOT NULL,
	`progress` double NOT NULL,
	`attempts` int NOT NULL,
	`lease_until` datetime(3),
	`claim_id` char(36),
	`cancel_requested` int NOT NULL,
	`failure` text,
	`created_by` char(36),
	`created_at` datetime(3) NOT NULL,
	`finished_at` datetime(3),
	CONSTRAINT `task_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `membership` (
	`shop_id` char(36) NOT NULL,
	`user_id` char(36) NOT NULL,
	`role` varchar(12) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `membership_shop_id_user_id_pk` PRIMARY KEY(`shop_id`,`user_id`)
);
--> statement-breakpoint
CREATE TABLE `user` (
	`id` char(36) NOT NULL,
	`email` varchar(254) NOT NULL,
	`name` varchar(120) NOT NULL,
	`password_hash` varchar(255) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `user_id` PRIMARY KEY(`id`),
	CONSTRAINT `user_email` UNIQUE(`email`)
);
--> statement-breakpoint
ALTER TABLE `board` ADD CONSTRAINT `board_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `moisture_reading` ADD CONSTRAINT `moisture_reading_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `moisture_reading` ADD CONSTRAINT `moisture_reading_board_id_board_id_fk` FOREIGN KEY (`board_id`) REFERENCES `board`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `moisture_reading` ADD CONSTRAINT `moisture_reading_taken_by_user_id_fk` FOREIGN KEY (`taken_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `history` ADD CONSTRAINT `history_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `history` ADD CONSTRAINT `history_user_id_user_id_fk` FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `face` ADD CONSTRAINT `face_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `face` ADD CONSTRAINT `face_job_id_job_id_fk` FOREIGN KEY (`job_id`) REFERENCES `job`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `job` ADD CONSTRAINT `job_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `layout` ADD CONSTRAINT `layout_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `layout` ADD CONSTRAINT `layout_face_id_face_id_fk` FOREIGN KEY (`face_id`) REFERENCES `face`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `layout` ADD CONSTRAINT `layout_crosscut_saw_id_saw_id_fk` FOREIGN KEY (`crosscut_saw_id`) REFERENCES `saw`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `layout` ADD CONSTRAINT `layout_rip_saw_id_saw_id_fk` FOREIGN KEY (`rip_saw_id`) REFERENCES `saw`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `layout` ADD CONSTRAINT `layout_updated_by_user_id_fk` FOREIGN KEY (`updated_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `layout_board` ADD CONSTRAINT `layout_board_layout_id_layout_id_fk` FOREIGN KEY (`layout_id`) REFERENCES `layout`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `layout_board` ADD CONSTRAINT `layout_board_board_id_board_id_fk` FOREIGN KEY (`board_id`) REFERENCES `board`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `layout_board` ADD CONSTRAINT `layout_board_straightening_id_straightening_id_fk` FOREIGN KEY (`straightening_id`) REFERENCES `straightening`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `layout_board` ADD CONSTRAINT `layout_board_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cut_order` ADD CONSTRAINT `cut_order_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cut_order` ADD CONSTRAINT `cut_order_job_id_job_id_fk` FOREIGN KEY (`job_id`) REFERENCES `job`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cut_order_face` ADD CONSTRAINT `cut_order_face_order_id_cut_order_id_fk` FOREIGN KEY (`order_id`) REFERENCES `cut_order`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cut_order_face` ADD CONSTRAINT `cut_order_face_face_id_face_id_fk` FOREIGN KEY (`face_id`) REFERENCES `face`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cut_order_face` ADD CONSTRAINT `cut_order_face_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `order_revision` ADD CONSTRAINT `order_revision_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `order_revision` ADD CONSTRAINT `order_revision_order_id_cut_order_id_fk` FOREIGN KEY (`order_id`) REFERENCES `cut_order`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `order_revision` ADD CONSTRAINT `order_revision_issued_by_user_id_fk` FOREIGN KEY (`issued_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `step_tick` ADD CONSTRAINT `step_tick_revision_id_order_revision_id_fk` FOREIGN KEY (`revision_id`) REFERENCES `order_revision`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `step_tick` ADD CONSTRAINT `step_tick_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `step_tick` ADD CONSTRAINT `step_tick_ticked_by_user_id_fk` FOREIGN KEY (`ticked_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `photo` ADD CONSTRAINT `photo_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `photo` ADD CONSTRAINT `photo_uploaded_by_user_id_fk` FOREIGN KEY (`uploaded_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `session` ADD CONSTRAINT `session_user_id_user_id_fk` FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `session` ADD CONSTRAINT `session_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `saw` ADD CONSTRAINT `saw_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `board_picture` ADD CONSTRAINT `board_picture_board_id_board_id_fk` FOREIGN KEY (`board_id`) REFERENCES `board`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `board_picture` ADD CONSTRAINT `board_picture_straightening_id_straightening_id_fk` FOREIGN KEY (`straightening_id`) REFERENCES `straightening`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `board_picture` ADD CONSTRAINT `board_picture_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `keep_clear` ADD CONSTRAINT `keep_clear_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `keep_clear` ADD CONSTRAINT `keep_clear_straightening_id_straightening_id_fk` FOREIGN KEY (`straightening_id`) REFERENCES `straightening`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `straightening` ADD CONSTRAINT `straightening_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `straightening` ADD CONSTRAINT `straightening_board_id_board_id_fk` FOREIGN KEY (`board_id`) REFERENCES `board`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `straightening` ADD CONSTRAINT `straightening_photo_id_photo_id_fk` FOREIGN KEY (`photo_id`) REFERENCES `photo`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `straightening` ADD CONSTRAINT `straightening_task_id_task_id_fk` FOREIGN KEY (`task_id`) REFERENCES `task`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `straightening` ADD CONSTRAINT `straightening_created_by_user_id_fk` FOREIGN KEY (`created_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `task` ADD CONSTRAINT `task_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `task` ADD CONSTRAINT `task_created_by_user_id_fk` FOREIGN KEY (`created_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `membership` ADD CONSTRAINT `membership_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `membership` ADD CONSTRAINT `membership_user_id_user_id_fk` FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `board_species` ON `board` (`shop_id`,`species`,`id`);--> statement-breakpoint
CREATE INDEX `board_length` ON `board` (`shop_id`,`length_um`,`id`);--> statement-breakpoint
CREATE INDEX `board_width` ON `board` (`shop_id`,`width_um`,`id`);--> statement-breakpoint
CREATE INDEX `board_thickness` ON `board` (`shop_id`,`thickness_um`,`id`);--> statement-breakpoint
CREATE INDEX `board_moisture` ON `board` (`shop_id`,`moisture_tenths`,`id`);--> statement-breakpoint
CREATE INDEX `board_place` ON `board` (`shop_id`,`place`,`id`);--> statement-breakpoint
CREATE INDEX `board_created` ON `board` (`shop_id`,`created_at`,`id`);--> statement-breakpoint
CREATE INDEX `moisture_board` ON `moisture_reading` (`board_id`,`taken_on`);--> statement-breakpoint
CREATE INDEX `history_thing` ON `history` (`shop_id`,`noun`,`noun_id`,`at`);--> statement-breakpoint
CREATE INDEX `history_recent` ON `history` (`shop_id`,`at`);--> statement-breakpoint
CREATE INDEX `face_shop` ON `face` (`shop_id`);--> statement-breakpoint
CREATE INDEX `job_recent` ON `job` (`shop_id`,`state`,`updated_at`);--> statement-breakpoint
CREATE INDEX `layout_shop` ON `layout` (`shop_id`);--> statement-breakpoint
CREATE INDEX `layout_board_board` ON `layout_board` (`board_id`);--> statement-breakpoint
CREATE INDEX `cut_order_recent` ON `cut_order` (`shop_id`,`state`,`updated_at`);--> statement-breakpoint
CREATE INDEX `cut_order_job` ON `cut_order` (`job_id`);--> statement-breakpoint
CREATE INDEX `cut_order_face_face` ON `cut_order_face` (`face_id`);--> statement-breakpoint
CREATE INDEX `order_revision_shop` ON `order_revision` (`shop_id`);--> statement-breakpoint
CREATE INDEX `photo_sha` ON `photo` (`shop_id`,`sha256`);--> statement-breakpoint
CREATE INDEX `photo_recent` ON `photo` (`shop_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `rate_limit_expire` ON `rate_limit` (`expire`);--> statement-breakpoint
CREATE INDEX `session_user` ON `session` (`user_id`);--> statement-breakpoint
CREATE INDEX `session_expires` ON `session` (`expires_at`);--> statement-breakpoint
CREATE INDEX `saw_shop` ON `saw` (`shop_id`);--> statement-breakpoint
CREATE INDEX `keep_clear_straightening` ON `keep_clear` (`straightening_id`);--> statement-breakpoint
CREATE INDEX `straightening_shop` ON `straightening` (`shop_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `task_claim` ON `task` (`state`,`lease_until`,`id`);--> statement-breakpoint
CREATE INDEX `task_shop` ON `task` (`shop_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `membership_user` ON `membership` (`user_id`);