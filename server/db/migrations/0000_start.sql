CREATE TABLE `equipment` (
	`id` text PRIMARY KEY NOT NULL,
	`kind` text NOT NULL,
	`name` text NOT NULL,
	`description` text DEFAULT '' NOT NULL,
	`details` text NOT NULL,
	`in_service` integer DEFAULT true NOT NULL,
	`calibration` text,
	`due_on` text,
	`created_at` text NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `equipment_name` ON `equipment` (lower("name"));--> statement-breakpoint
CREATE INDEX `equipment_kind` ON `equipment` (`kind`,`name`);--> statement-breakpoint
CREATE INDEX `equipment_due` ON `equipment` (`due_on`);--> statement-breakpoint
CREATE TABLE `events` (
	`seq` integer PRIMARY KEY NOT NULL,
	`at` text NOT NULL,
	`actor_id` text,
	`actor_name` text NOT NULL,
	`kind` text NOT NULL,
	`subject_type` text NOT NULL,
	`subject_id` text NOT NULL,
	`data` text NOT NULL,
	`prev_hash` text NOT NULL,
	`hash` text NOT NULL,
	FOREIGN KEY (`actor_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `events_subject` ON `events` (`subject_type`,`subject_id`,`seq`);--> statement-breakpoint
CREATE TABLE `customers` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`address` text DEFAULT '' NOT NULL,
	`email` text DEFAULT '' NOT NULL,
	`created_at` text NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `customers_name` ON `customers` (lower("name"));--> statement-breakpoint
CREATE TABLE `faces` (
	`id` text PRIMARY KEY NOT NULL,
	`part_id` text NOT NULL,
	`position` integer NOT NULL,
	`name` text NOT NULL,
	`size` text NOT NULL,
	`tolerance` text NOT NULL,
	`reference` text NOT NULL,
	`rule` text NOT NULL,
	`edge_band_mm` real NOT NULL,
	`support` text NOT NULL,
	`template` text,
	`created_at` text NOT NULL,
	FOREIGN KEY (`part_id`) REFERENCES `parts`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `faces_part_name` ON `faces` (`part_id`,lower("name"));--> statement-breakpoint
CREATE TABLE `lots` (
	`id` text PRIMARY KEY NOT NULL,
	`part_id` text NOT NULL,
	`number` text NOT NULL,
	`order` text DEFAULT '' NOT NULL,
	`created_at` text NOT NULL,
	FOREIGN KEY (`part_id`) REFERENCES `parts`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `lots_part_number` ON `lots` (`part_id`,lower("number"));--> statement-breakpoint
CREATE TABLE `parts` (
	`id` text PRIMARY KEY NOT NULL,
	`customer_id` text NOT NULL,
	`number` text NOT NULL,
	`revision` text DEFAULT '' NOT NULL,
	`name` text NOT NULL,
	`material` text DEFAULT '' NOT NULL,
	`created_at` text NOT NULL,
	FOREIGN KEY (`customer_id`) REFERENCES `customers`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `parts_number_revision` ON `parts` (lower("number"),lower("revision"));--> statement-breakpoint
CREATE INDEX `parts_customer` ON `parts` (`customer_id`);--> statement-breakpoint
CREATE TABLE `pieces` (
	`id` text PRIMARY KEY NOT NULL,
	`part_id` text NOT NULL,
	`lot_id` text,
	`serial` text NOT NULL,
	`created_at` text NOT NULL,
	FOREIGN KEY (`part_id`) REFERENCES `parts`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`lot_id`) REFERENCES `lots`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `pieces_part_serial` ON `pieces` (`part_id`,lower("serial"));--> statement-breakpoint
CREATE INDEX `pieces_created` ON `pieces` (`created_at`,`id`);--> statement-breakpoint
CREATE INDEX `pieces_lot` ON `pieces` (`lot_id`);--> statement-breakpoint
CREATE TABLE `people` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`email` text NOT NULL,
	`password_hash` text NOT NULL,
	`active` integer DEFAULT true NOT NULL,
	`created_at` text NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `people_email` ON `people` (`email`);--> statement-breakpoint
CREATE TABLE `person_roles` (
	`person_id` text NOT NULL,
	`role` text NOT NULL,
	PRIMARY KEY(`person_id`, `role`),
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`expires_at` integer NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `sessions_user` ON `sessions` (`user_id`);--> statement-breakpoint
CREATE INDEX `sessions_expiry` ON `sessions` (`expires_at`);--> statement-breakpoint
CREATE TABLE `sign_in_attempts` (
	`id` integer PRIMARY KEY NOT NULL,
	`at` text NOT NULL,
	`account` text NOT NULL,
	`address` text NOT NULL,
	`succeeded` integer DEFAULT false NOT NULL
);
--> statement-breakpoint
CREATE INDEX `sign_in_attempts_account` ON `sign_in_attempts` (`account`,`at`);--> statement-breakpoint
CREATE INDEX `sign_in_attempts_address` ON `sign_in_attempts` (`address`,`at`);--> statement-breakpoint
CREATE INDEX `sign_in_attempts_known` ON `sign_in_attempts` (`account`,`address`,`at`) WHERE succeeded = 1;--> statement-breakpoint
CREATE TABLE `photos` (
	`sha256` text PRIMARY KEY NOT NULL,
	`format` text NOT NULL,
	`width_px` integer NOT NULL,
	`height_px` integer NOT NULL,
	`bit_depth` integer NOT NULL,
	`channels` integer NOT NULL,
	`bytes` integer NOT NULL,
	`created_at` text NOT NULL
);
--> statement-breakpoint
CREATE TABLE `reading_photos` (
	`id` text PRIMARY KEY NOT NULL,
	`reading_id` text NOT NULL,
	`sha256` text NOT NULL,
	`role` text NOT NULL,
	`file_name` text NOT NULL,
	`added_at` text NOT NULL,
	`added_by_id` text NOT NULL,
	FOREIGN KEY (`reading_id`) REFERENCES `readings`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`sha256`) REFERENCES `photos`(`sha256`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`added_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `reading_photos_once` ON `reading_photos` (`reading_id`,`sha256`);--> statement-breakpoint
CREATE INDEX `reading_photos_first` ON `reading_photos` (`reading_id`,`role`,`added_at`);--> statement-breakpoint
CREATE INDEX `reading_photos_sha256` ON `reading_photos` (`sha256`);--> statement-breakpoint
CREATE TABLE `readings` (
	`id` text PRIMARY KEY NOT NULL,
	`piece_id` text NOT NULL,
	`face_id` text NOT NULL,
	`number` integer NOT NULL,
	`state` text NOT NULL,
	`taken_by_id` text NOT NULL,
	`corrects_id` text,
	`latest_result_id` text,
	`sent_back_reason` text,
	`set_aside_cause` text,
	`sent_at` text,
	`created_at` text NOT NULL,
	`updated_at` text NOT NULL,
	`marks_version` integer DEFAULT 0 NOT NULL,
	`marks_saved_at` text,
	`marks_saved_by_id` text,
	`set_up` text NOT NULL,
	`conditions` text NOT NULL,
	`marks` text NOT NULL,
	FOREIGN KEY (`piece_id`) REFERENCES `pieces`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`face_id`) REFERENCES `faces`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`taken_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`corrects_id`) REFERENCES `readings`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`latest_result_id`) REFERENCES `results`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`marks_saved_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `readings_piece_face_number` ON `readings` (`piece_id`,`face_id`,`number`);--> statement-breakpoint
CREATE INDEX `readings_created` ON `readings` (`created_at`,`id`,`piece_id`,`face_id`);--> statement-breakpoint
CREATE INDEX `readings_state_created` ON `readings` (`state`,`created_at`,`id`);--> statement-breakpoint
CREATE INDEX `readings_taker_created` ON `readings` (`taken_by_id`,`created_at`,`id`);--> statement-breakpoint
CREATE INDEX `readings_piece_created` ON `readings` (`piece_id`,`created_at`,`id`);--> statement-breakpoint
CREATE INDEX `readings_face` ON `readings` (`face_id`);--> statement-breakpoint
CREATE TABLE `results` (
	`id` text PRIMARY KEY NOT NULL,
	`reading_id` text NOT NULL,
	`marks_version` integer NOT NULL,
	`engine_version` text NOT NULL,
	`mode` text NOT NULL,
	`outcome` text NOT NULL,
	`flatness_um` real,
	`minimum_zone_um` real,
	`least_squares_um` real,
	`expanded_uncertainty_um` real,
	`sagitta_um` real,
	`band_um` real,
	`form` text,
	`verdict` text NOT NULL,
	`supported_share` real,
	`computed_at` text NOT NULL,
	`computed_by_id` text,
	`face` text NOT NULL,
	`findings` text NOT NULL,
	`inputs` text NOT NULL,
	`figure` text,
	FOREIGN KEY (`reading_id`) REFERENCES `readings`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`computed_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `results_reading` ON `results` (`reading_id`,`computed_at`);--> statement-breakpoint
CREATE INDEX `results_verdict` ON `results` (`verdict`,`computed_at`);--> statement-breakpoint
CREATE TABLE `certificates` (
	`id` text PRIMARY KEY NOT NULL,
	`number` text NOT NULL,
	`piece_id` text NOT NULL,
	`reading_id` text NOT NULL,
	`state` text NOT NULL,
	`issued_by_id` text NOT NULL,
	`issued_at` text NOT NULL,
	FOREIGN KEY (`piece_id`) REFERENCES `pieces`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`reading_id`) REFERENCES `readings`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`issued_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `certificates_number` ON `certificates` (`number`);--> statement-breakpoint
CREATE INDEX `certificates_piece` ON `certificates` (`piece_id`);--> statement-breakpoint
CREATE INDEX `certificates_reading` ON `certificates` (`reading_id`);--> statement-breakpoint
CREATE TABLE `review_remarks` (
	`id` text PRIMARY KEY NOT NULL,
	`reading_id` text NOT NULL,
	`author_id` text NOT NULL,
	`text` text NOT NULL,
	`place` text,
	`created_at` text NOT NULL,
	FOREIGN KEY (`reading_id`) REFERENCES `readings`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`author_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `review_remarks_reading` ON `review_remarks` (`reading_id`,`created_at`);--> statement-breakpoint
CREATE TABLE `settings` (
	`id` integer PRIMARY KEY NOT NULL,
	`shop_name` text NOT NULL,
	`shop_address` text DEFAULT '' NOT NULL,
	`shop_email` text DEFAULT '' NOT NULL,
	`display_unit` text DEFAULT 'um' NOT NULL,
	`allow_plain_network` integer DEFAULT false NOT NULL,
	`one_person_shop` integer DEFAULT false NOT NULL,
	`least_supported_share` real DEFAULT 0.9 NOT NULL,
	`updated_at` text NOT NULL,
	CONSTRAINT "settings_one_row" CHECK("settings"."id" = 1)
);
