-- The trail of events only ever grows, and each row follows on the one before it.
CREATE TRIGGER `events_no_update` BEFORE UPDATE ON `events`
BEGIN
  SELECT RAISE(ABORT, 'events are append-only');
END;
--> statement-breakpoint
CREATE TRIGGER `events_no_delete` BEFORE DELETE ON `events`
BEGIN
  SELECT RAISE(ABORT, 'events are append-only');
END;
--> statement-breakpoint
-- INSERT OR REPLACE deletes without firing the delete trigger, so an insert must be the next in the chain.
CREATE TRIGGER `events_in_order` BEFORE INSERT ON `events`
WHEN NEW.`seq` IS NOT coalesce((SELECT max(`seq`) FROM `events`), 0) + 1
  OR NEW.`prev_hash` IS NOT coalesce((SELECT `hash` FROM `events` ORDER BY `seq` DESC LIMIT 1), '')
BEGIN
  SELECT RAISE(ABORT, 'an event must follow on the last one');
END;
--> statement-breakpoint
-- A result stands as it was computed; computing again adds another beside it.
CREATE TRIGGER `results_no_update` BEFORE UPDATE ON `results`
BEGIN
  SELECT RAISE(ABORT, 'results are never changed');
END;
--> statement-breakpoint
CREATE TRIGGER `results_no_delete` BEFORE DELETE ON `results`
BEGIN
  SELECT RAISE(ABORT, 'results are never removed');
END;
--> statement-breakpoint
CREATE TRIGGER `results_no_replace` BEFORE INSERT ON `results`
WHEN EXISTS (SELECT 1 FROM `results` WHERE `id` = NEW.`id`)
BEGIN
  SELECT RAISE(ABORT, 'results are never changed');
END;
