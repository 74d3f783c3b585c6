CREATE TRIGGER `record_no_update` BEFORE UPDATE ON `record`
BEGIN
  SELECT RAISE(ABORT, 'the record is append-only');
END;
--> statement-breakpoint
CREATE TRIGGER `record_no_delete` BEFORE DELETE ON `record`
BEGIN
  SELECT RAISE(ABORT, 'the record is append-only');
END;
