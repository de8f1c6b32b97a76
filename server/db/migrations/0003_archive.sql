ALTER TABLE `readings` ADD `verdict` text;
--> statement-breakpoint
-- Readings of before get the verdict of their latest result; a certified one is otherwise never changed.
DROP TRIGGER `readings_certified_no_update`;
--> statement-breakpoint
UPDATE `readings` SET `verdict` = (SELECT `verdict` FROM `results` WHERE `results`.`id` = `readings`.`latest_result_id`);
--> statement-breakpoint
CREATE TRIGGER `readings_certified_no_update` BEFORE UPDATE ON `readings`
WHEN OLD.`state` = 'certified'
BEGIN
  SELECT RAISE(ABORT, 'a certified reading is never changed');
END;
--> statement-breakpoint
CREATE INDEX `readings_taker_state` ON `readings` (`taken_by_id`,`state`,`created_at`,`id`);--> statement-breakpoint
CREATE INDEX `readings_verdict` ON `readings` (`verdict`,`created_at`,`id`,`state`,`piece_id`,`face_id`);
