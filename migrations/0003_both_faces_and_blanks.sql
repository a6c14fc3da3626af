CREATE TABLE `blank` (
	`board_id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`jointing_um` int NOT NULL,
	CONSTRAINT `blank_board_id` PRIMARY KEY(`board_id`)
);
--> statement-breakpoint
CREATE TABLE `blank_member` (
	`blank_id` char(36) NOT NULL,
	`position` int NOT NULL,
	`shop_id` char(36) NOT NULL,
	`board_id` char(36) NOT NULL,
	`straightening_id` char(36) NOT NULL,
	`end_for_end` boolean NOT NULL,
	`along_um` int NOT NULL,
	`trim_upper_um` int NOT NULL,
	`trim_lower_um` int NOT NULL,
	CONSTRAINT `blank_member_blank_id_position_pk` PRIMARY KEY(`blank_id`,`position`),
	CONSTRAINT `blank_member_board` UNIQUE(`board_id`)
);
--> statement-breakpoint
CREATE TABLE `glue_line` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`straightening_id` char(36) NOT NULL,
	`across_um` int NOT NULL,
	`above_board_id` char(36),
	`below_board_id` char(36),
	CONSTRAINT `glue_line_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
ALTER TABLE `straightening` MODIFY COLUMN `photo_id` char(36);--> statement-breakpoint
ALTER TABLE `straightening` MODIFY COLUMN `marking` json;--> statement-breakpoint
ALTER TABLE `board` ADD `kind` varchar(8) DEFAULT 'board' NOT NULL;--> statement-breakpoint
ALTER TABLE `shop` ADD `jointing_um` int DEFAULT 1500 NOT NULL;--> statement-breakpoint
ALTER TABLE `board_picture` ADD `back_straightening_id` char(36);--> statement-breakpoint
ALTER TABLE `straightening` ADD `side` varchar(4) DEFAULT 'face' NOT NULL;--> statement-breakpoint
ALTER TABLE `blank` ADD CONSTRAINT `blank_board_id_board_id_fk` FOREIGN KEY (`board_id`) REFERENCES `board`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `blank` ADD CONSTRAINT `blank_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `blank_member` ADD CONSTRAINT `blank_member_blank_id_blank_board_id_fk` FOREIGN KEY (`blank_id`) REFERENCES `blank`(`board_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `blank_member` ADD CONSTRAINT `blank_member_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `blank_member` ADD CONSTRAINT `blank_member_board_id_board_id_fk` FOREIGN KEY (`board_id`) REFERENCES `board`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `blank_member` ADD CONSTRAINT `blank_member_straightening_id_straightening_id_fk` FOREIGN KEY (`straightening_id`) REFERENCES `straightening`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `glue_line` ADD CONSTRAINT `glue_line_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `glue_line` ADD CONSTRAINT `glue_line_straightening_id_straightening_id_fk` FOREIGN KEY (`straightening_id`) REFERENCES `straightening`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `glue_line` ADD CONSTRAINT `glue_line_above_board_id_board_id_fk` FOREIGN KEY (`above_board_id`) REFERENCES `board`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `glue_line` ADD CONSTRAINT `glue_line_below_board_id_board_id_fk` FOREIGN KEY (`below_board_id`) REFERENCES `board`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `glue_line_straightening` ON `glue_line` (`straightening_id`,`across_um`);--> statement-breakpoint
ALTER TABLE `board_picture` ADD CONSTRAINT `board_picture_back_straightening_id_straightening_id_fk` FOREIGN KEY (`back_straightening_id`) REFERENCES `straightening`(`id`) ON DELETE no action ON UPDATE no action;