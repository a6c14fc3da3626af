CREATE TABLE `as_cut` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`revision_id` char(36) NOT NULL,
	`kind` varchar(12) NOT NULL,
	`subject` varchar(120) NOT NULL,
	`entry` json NOT NULL,
	`version` int NOT NULL,
	`entered_by` char(36) NOT NULL,
	`entered_at` datetime(3) NOT NULL,
	CONSTRAINT `as_cut_id` PRIMARY KEY(`id`),
	CONSTRAINT `as_cut_subject` UNIQUE(`revision_id`,`subject`)
);
--> statement-breakpoint
ALTER TABLE `as_cut` ADD CONSTRAINT `as_cut_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `as_cut` ADD CONSTRAINT `as_cut_revision_id_order_revision_id_fk` FOREIGN KEY (`revision_id`) REFERENCES `order_revision`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `as_cut` ADD CONSTRAINT `as_cut_entered_by_user_id_fk` FOREIGN KEY (`entered_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `as_cut_shop` ON `as_cut` (`shop_id`);