CREATE TABLE `wood_search` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`face_id` char(36) NOT NULL,
	`scope` varchar(8) NOT NULL,
	`group_id` varchar(40) NOT NULL,
	`layout_revision` int NOT NULL,
	`document` json NOT NULL,
	`weights` json NOT NULL,
	`species` varchar(80),
	`least_thickness_um` int,
	`most_thickness_um` int,
	`task_id` char(36),
	`started_by` char(36) NOT NULL,
	`started_at` datetime(3) NOT NULL,
	CONSTRAINT `wood_search_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `wood_search_board` (
	`search_id` char(36) NOT NULL,
	`board_id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`tag_number` int NOT NULL,
	`straightening_id` char(36),
	`stock` double NOT NULL,
	`total` double,
	`finding` json,
	CONSTRAINT `wood_search_board_search_id_board_id_pk` PRIMARY KEY(`search_id`,`board_id`)
);
--> statement-breakpoint
ALTER TABLE `wood_search` ADD CONSTRAINT `wood_search_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `wood_search` ADD CONSTRAINT `wood_search_face_id_face_id_fk` FOREIGN KEY (`face_id`) REFERENCES `face`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `wood_search` ADD CONSTRAINT `wood_search_task_id_task_id_fk` FOREIGN KEY (`task_id`) REFERENCES `task`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `wood_search` ADD CONSTRAINT `wood_search_started_by_user_id_fk` FOREIGN KEY (`started_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `wood_search_board` ADD CONSTRAINT `wood_search_board_search_id_wood_search_id_fk` FOREIGN KEY (`search_id`) REFERENCES `wood_search`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `wood_search_board` ADD CONSTRAINT `wood_search_board_board_id_board_id_fk` FOREIGN KEY (`board_id`) REFERENCES `board`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `wood_search_board` ADD CONSTRAINT `wood_search_board_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `wood_search_board` ADD CONSTRAINT `wood_search_board_straightening_id_straightening_id_fk` FOREIGN KEY (`straightening_id`) REFERENCES `straightening`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `wood_search_face` ON `wood_search` (`face_id`,`scope`);--> statement-breakpoint
CREATE INDEX `wood_search_shop` ON `wood_search` (`shop_id`);--> statement-breakpoint
CREATE INDEX `wood_search_board_total` ON `wood_search_board` (`search_id`,`total`,`tag_number`);--> statement-breakpoint
CREATE INDEX `wood_search_board_board` ON `wood_search_board` (`board_id`);