CREATE TABLE `order_revision_board` (
	`revision_id` char(36) NOT NULL,
	`board_id` char(36) NOT NULL,
	`straightening_id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	CONSTRAINT `order_revision_board_revision_id_board_id_pk` PRIMARY KEY(`revision_id`,`board_id`)
);
--> statement-breakpoint
ALTER TABLE `order_revision_board` ADD CONSTRAINT `order_revision_board_revision_id_order_revision_id_fk` FOREIGN KEY (`revision_id`) REFERENCES `order_revision`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `order_revision_board` ADD CONSTRAINT `order_revision_board_board_id_board_id_fk` FOREIGN KEY (`board_id`) REFERENCES `board`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `order_revision_board` ADD CONSTRAINT `order_revision_board_straightening_id_straightening_id_fk` FOREIGN KEY (`straightening_id`) REFERENCES `straightening`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `order_revision_board` ADD CONSTRAINT `order_revision_board_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `order_revision_board_board` ON `order_revision_board` (`board_id`);--> statement-breakpoint
-- What was issued before is in the snapshots only.
INSERT INTO `order_revision_board` (`revision_id`, `board_id`, `straightening_id`, `shop_id`)
SELECT `order_revision`.`id`, `cut`.`board_id`, `cut`.`straightening_id`, `order_revision`.`shop_id`
FROM `order_revision`, JSON_TABLE(`order_revision`.`snapshot`, '$.boards[*]' COLUMNS (
	`board_id` char(36) PATH '$.boardId',
	`straightening_id` char(36) PATH '$.straighteningId'
)) AS `cut`;
