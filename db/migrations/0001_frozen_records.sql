-- What is signed, submitted or recorded does not change. A rebuild of one of these tables drops its triggers: make them again there.
CREATE TRIGGER `audit_events_no_update` BEFORE UPDATE ON `audit_events`
BEGIN
  SELECT RAISE(ABORT, 'the audit chain is append-only');
END;
--> statement-breakpoint
CREATE TRIGGER `audit_events_no_delete` BEFORE DELETE ON `audit_events`
BEGIN
  SELECT RAISE(ABORT, 'the audit chain is append-only');
END;
--> statement-breakpoint
CREATE TRIGGER `signatures_no_update` BEFORE UPDATE ON `signatures`
BEGIN
  SELECT RAISE(ABORT, 'a signature stays as it was given');
END;
--> statement-breakpoint
CREATE TRIGGER `signatures_no_delete` BEFORE DELETE ON `signatures`
BEGIN
  SELECT RAISE(ABORT, 'a signature stays as it was given');
END;
--> statement-breakpoint
CREATE TRIGGER `check_reports_no_update` BEFORE UPDATE ON `check_reports`
BEGIN
  SELECT RAISE(ABORT, 'a check report stays; a new version stands beside it');
END;
--> statement-breakpoint
CREATE TRIGGER `check_reports_no_delete` BEFORE DELETE ON `check_reports`
BEGIN
  SELECT RAISE(ABORT, 'a check report stays; a new version stands beside it');
END;
--> statement-breakpoint
CREATE TRIGGER `prints_no_update` BEFORE UPDATE ON `prints`
BEGIN
  SELECT RAISE(ABORT, 'a print stays recorded');
END;
--> statement-breakpoint
CREATE TRIGGER `prints_no_delete` BEFORE DELETE ON `prints`
BEGIN
  SELECT RAISE(ABORT, 'a print stays recorded');
END;
--> statement-breakpoint
CREATE TRIGGER `debriefs_raw_locked` BEFORE UPDATE OF `id`, `sortie_id`, `content`, `content_digest`, `submitted_by`, `submitted_at` ON `debriefs`
BEGIN
  SELECT RAISE(ABORT, 'raw readings are locked at submit');
END;
--> statement-breakpoint
CREATE TRIGGER `debriefs_no_delete` BEFORE DELETE ON `debriefs`
BEGIN
  SELECT RAISE(ABORT, 'raw readings are locked at submit');
END;
--> statement-breakpoint
CREATE TRIGGER `calibrations_no_edit` BEFORE UPDATE OF `id`, `instrument_id`, `kind`, `gain`, `offset`, `points`, `low`, `high`, `expanded_uncertainty`, `unit`, `method`, `reference`, `calibrated_on`, `valid_until`, `created_at`, `created_by` ON `calibrations`
BEGIN
  SELECT RAISE(ABORT, 'a calibration is replaced, never edited');
END;
--> statement-breakpoint
CREATE TRIGGER `calibrations_superseded_once` BEFORE UPDATE OF `superseded_at` ON `calibrations`
WHEN OLD.`superseded_at` IS NOT NULL AND NEW.`superseded_at` IS NOT OLD.`superseded_at`
BEGIN
  SELECT RAISE(ABORT, 'a replaced calibration stays replaced');
END;
--> statement-breakpoint
CREATE TRIGGER `calibrations_no_delete` BEFORE DELETE ON `calibrations`
BEGIN
  SELECT RAISE(ABORT, 'a calibration is replaced, never deleted');
END;
--> statement-breakpoint
CREATE TRIGGER `card_revisions_frozen_content` BEFORE UPDATE OF `id`, `card_id`, `letter`, `content`, `author_id`, `edited_by`, `created_at`, `submitted_at`, `submitted_by`, `answers`, `findings`, `document`, `digest`, `code`, `released_at`, `released_by` ON `card_revisions`
WHEN OLD.`state` IN ('released', 'superseded', 'withdrawn')
BEGIN
  SELECT RAISE(ABORT, 'a released revision is frozen');
END;
--> statement-breakpoint
CREATE TRIGGER `card_revisions_frozen_state` BEFORE UPDATE OF `state` ON `card_revisions`
WHEN (OLD.`state` = 'released' AND NEW.`state` NOT IN ('released', 'superseded', 'withdrawn')) OR (OLD.`state` IN ('superseded', 'withdrawn') AND NEW.`state` <> OLD.`state`)
BEGIN
  SELECT RAISE(ABORT, 'a released revision can only be superseded or withdrawn');
END;
--> statement-breakpoint
CREATE TRIGGER `card_revisions_frozen_delete` BEFORE DELETE ON `card_revisions`
WHEN OLD.`state` IN ('released', 'superseded', 'withdrawn')
BEGIN
  SELECT RAISE(ABORT, 'a released revision is frozen');
END;
--> statement-breakpoint
CREATE TRIGGER `point_dispositions_no_edit` BEFORE UPDATE OF `id`, `sortie_id`, `revision_id`, `point_id`, `disposition`, `why`, `decided_by`, `decided_at` ON `point_dispositions`
BEGIN
  SELECT RAISE(ABORT, 'a disposition is replaced, never edited');
END;
--> statement-breakpoint
CREATE TRIGGER `point_dispositions_no_delete` BEFORE DELETE ON `point_dispositions`
BEGIN
  SELECT RAISE(ABORT, 'a disposition is replaced, never deleted');
END;
