ALTER TABLE `sorties` ADD `closed_at` text;--> statement-breakpoint
ALTER TABLE `sorties` ADD `closed_by` text REFERENCES users(id);--> statement-breakpoint
ALTER TABLE `squawks` ADD `assessed_by` text REFERENCES users(id);--> statement-breakpoint
ALTER TABLE `squawks` ADD `assessed_at` text;--> statement-breakpoint
ALTER TABLE `squawks` ADD `assessed_why` text;--> statement-breakpoint
ALTER TABLE `squawks` ADD `disposition_why` text;--> statement-breakpoint
ALTER TABLE `squawks` ADD `disposition_limit` text;--> statement-breakpoint
ALTER TABLE `squawks` ADD `entry_reference` text;--> statement-breakpoint
ALTER TABLE `squawks` ADD `dispositioned_by` text REFERENCES users(id);--> statement-breakpoint
ALTER TABLE `squawks` ADD `dispositioned_at` text;--> statement-breakpoint
ALTER TABLE `squawks` ADD `verified_reference` text;--> statement-breakpoint
ALTER TABLE `squawks` ADD `verified_by` text REFERENCES users(id);--> statement-breakpoint
ALTER TABLE `squawks` ADD `verified_at` text;--> statement-breakpoint
ALTER TABLE `squawks` ADD `closed_by` text REFERENCES users(id);