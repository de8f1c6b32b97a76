-- Nothing could be written to the first table of certificates, so it is made anew with all that a certificate holds.
DROP TABLE `certificates`;
--> statement-breakpoint
CREATE TABLE `certificates` (
	`id` text PRIMARY KEY NOT NULL,
	`year` integer NOT NULL,
	`count` integer NOT NULL,
	`number` text NOT NULL,
	`check_code` text NOT NULL,
	`piece_id` text NOT NULL,
	`reading_id` text NOT NULL,
	`state` text NOT NULL,
	`issued_by_id` text NOT NULL,
	`issued_at` text NOT NULL,
	`replaces_id` text,
	`ended_by_id` text,
	`ended_at` text,
	`withdrawal_reason` text,
	`pdf_sha256` text NOT NULL,
	`snapshot` text NOT NULL,
	FOREIGN KEY (`piece_id`) REFERENCES `pieces`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`reading_id`) REFERENCES `readings`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`issued_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`replaces_id`) REFERENCES `certificates`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`ended_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `certificates_number` ON `certificates` (`number`);--> statement-breakpoint
CREATE UNIQUE INDEX `certificates_year_count` ON `certificates` (`year`,`count`);--> statement-breakpoint
CREATE UNIQUE INDEX `certificates_check_code` ON `certificates` (`check_code`);--> statement-breakpoint
CREATE INDEX `certificates_issued` ON `certificates` (`issued_at`,`id`);--> statement-breakpoint
CREATE INDEX `certificates_piece` ON `certificates` (`piece_id`);--> statement-breakpoint
CREATE INDEX `certificates_reading` ON `certificates` (`reading_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `certificates_replaces` ON `certificates` (`replaces_id`);--> statement-breakpoint
CREATE TABLE `certificate_pdfs` (
	`certificate_id` text PRIMARY KEY NOT NULL,
	`pdf` blob NOT NULL,
	FOREIGN KEY (`certificate_id`) REFERENCES `certificates`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `dispositions` (
	`id` text PRIMARY KEY NOT NULL,
	`piece_id` text NOT NULL,
	`reading_id` text NOT NULL,
	`kind` text NOT NULL,
	`reason` text NOT NULL,
	`on_word_of` text DEFAULT '' NOT NULL,
	`decided_by_id` text NOT NULL,
	`decided_at` text NOT NULL,
	FOREIGN KEY (`piece_id`) REFERENCES `pieces`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`reading_id`) REFERENCES `readings`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`decided_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `dispositions_piece` ON `dispositions` (`piece_id`,`decided_at`);--> statement-breakpoint
CREATE TABLE `remark_answers` (
	`id` text PRIMARY KEY NOT NULL,
	`remark_id` text NOT NULL,
	`author_id` text NOT NULL,
	`text` text NOT NULL,
	`created_at` text NOT NULL,
	FOREIGN KEY (`remark_id`) REFERENCES `review_remarks`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`author_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `remark_answers_remark` ON `remark_answers` (`remark_id`,`created_at`);--> statement-breakpoint
ALTER TABLE `readings` ADD `departure_reason` text;--> statement-breakpoint
ALTER TABLE `readings` ADD `lapped_since` integer DEFAULT false NOT NULL;--> statement-breakpoint
ALTER TABLE `readings` ADD `agreed_by_id` text REFERENCES people(id);--> statement-breakpoint
ALTER TABLE `readings` ADD `agreed_at` text;--> statement-breakpoint
ALTER TABLE `review_remarks` ADD `closed_by_id` text REFERENCES people(id);--> statement-breakpoint
ALTER TABLE `review_remarks` ADD `closed_at` text;--> statement-breakpoint
ALTER TABLE `settings` ADD `certificate_prefix` text DEFAULT 'FC' NOT NULL;--> statement-breakpoint
ALTER TABLE `settings` ADD `procedure` text DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE `settings` ADD `public_address` text DEFAULT '' NOT NULL;
--> statement-breakpoint
-- What was issued stands as it was issued; only whether it still holds may be added, once.
CREATE TRIGGER `certificates_as_issued` BEFORE UPDATE ON `certificates`
WHEN OLD.`state` <> 'issued'
  OR NEW.`id` IS NOT OLD.`id` OR NEW.`year` IS NOT OLD.`year` OR NEW.`count` IS NOT OLD.`count`
  OR NEW.`number` IS NOT OLD.`number` OR NEW.`check_code` IS NOT OLD.`check_code`
  OR NEW.`piece_id` IS NOT OLD.`piece_id` OR NEW.`reading_id` IS NOT OLD.`reading_id`
  OR NEW.`issued_by_id` IS NOT OLD.`issued_by_id` OR NEW.`issued_at` IS NOT OLD.`issued_at`
  OR NEW.`replaces_id` IS NOT OLD.`replaces_id` OR NEW.`pdf_sha256` IS NOT OLD.`pdf_sha256`
  OR NEW.`snapshot` IS NOT OLD.`snapshot`
BEGIN
  SELECT RAISE(ABORT, 'certificates are never changed');
END;
--> statement-breakpoint
CREATE TRIGGER `certificates_no_delete` BEFORE DELETE ON `certificates`
BEGIN
  SELECT RAISE(ABORT, 'certificates are never removed');
END;
--> statement-breakpoint
-- INSERT OR REPLACE deletes without firing the delete trigger; and a number follows on the last of its year.
CREATE TRIGGER `certificates_in_order` BEFORE INSERT ON `certificates`
WHEN EXISTS (SELECT 1 FROM `certificates` WHERE `id` = NEW.`id` OR `number` = NEW.`number`)
  OR NEW.`count` IS NOT coalesce((SELECT max(`count`) FROM `certificates` WHERE `year` = NEW.`year`), 0) + 1
BEGIN
  SELECT RAISE(ABORT, 'a certificate takes the next number');
END;
--> statement-breakpoint
CREATE TRIGGER `certificate_pdfs_no_update` BEFORE UPDATE ON `certificate_pdfs`
BEGIN
  SELECT RAISE(ABORT, 'certificates are never changed');
END;
--> statement-breakpoint
CREATE TRIGGER `certificate_pdfs_no_delete` BEFORE DELETE ON `certificate_pdfs`
BEGIN
  SELECT RAISE(ABORT, 'certificates are never removed');
END;
--> statement-breakpoint
-- A certified reading stays as its certificate says.
CREATE TRIGGER `readings_certified_no_update` BEFORE UPDATE ON `readings`
WHEN OLD.`state` = 'certified'
BEGIN
  SELECT RAISE(ABORT, 'a certified reading is never changed');
END;
--> statement-breakpoint
CREATE TRIGGER `readings_certified_no_delete` BEFORE DELETE ON `readings`
WHEN OLD.`state` = 'certified'
BEGIN
  SELECT RAISE(ABORT, 'a certified reading is never removed');
END;
