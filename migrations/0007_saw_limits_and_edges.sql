ALTER TABLE `board` ADD `true_edges` varchar(8) DEFAULT 'none' NOT NULL;--> statement-breakpoint
ALTER TABLE `board` ADD `to_be_flattened` boolean DEFAULT false NOT NULL;--> statement-breakpoint
ALTER TABLE `saw` ADD `rips` boolean DEFAULT true NOT NULL;--> statement-breakpoint
ALTER TABLE `saw` ADD `crosscuts` boolean DEFAULT true NOT NULL;--> statement-breakpoint
ALTER TABLE `saw` ADD `widest_rip_um` int;--> statement-breakpoint
ALTER TABLE `saw` ADD `longest_crosscut_um` int;--> statement-breakpoint
ALTER TABLE `saw` ADD `shortest_um` int DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE `saw` ADD `narrowest_um` int DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE `shop` ADD `rough_length_um` int DEFAULT 12500 NOT NULL;--> statement-breakpoint
ALTER TABLE `shop` ADD `rough_width_um` int DEFAULT 5000 NOT NULL;--> statement-breakpoint
-- What is usual for each kind, until the shop says what its own saws may take: common practice, no source.
UPDATE `saw` SET `shortest_um` = 150000, `narrowest_um` = 10000 WHERE `kind` = 'table';--> statement-breakpoint
UPDATE `saw` SET `shortest_um` = 300000, `narrowest_um` = 150000 WHERE `kind` = 'track';--> statement-breakpoint
UPDATE `saw` SET `crosscuts` = false, `widest_rip_um` = 300000, `shortest_um` = 100000 WHERE `kind` = 'band';--> statement-breakpoint
UPDATE `saw` SET `rips` = false WHERE `kind` = 'hand';
