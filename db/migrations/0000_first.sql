CREATE TABLE `audit_events` (
	`team_id` text NOT NULL,
	`sequence` integer NOT NULL,
	`at` text NOT NULL,
	`actor_id` text,
	`actor_name` text NOT NULL,
	`action` text NOT NULL,
	`subject` text NOT NULL,
	`before` text,
	`after` text,
	`previous_digest` text NOT NULL,
	`digest` text NOT NULL
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `audit_events_sequence` ON `audit_events` (`team_id`,`sequence`);--> statement-breakpoint
CREATE TABLE `card_revisions` (
	`id` text PRIMARY KEY NOT NULL,
	`card_id` text NOT NULL,
	`letter` text NOT NULL,
	`state` text NOT NULL,
	`content` text NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`author_id` text NOT NULL,
	`edited_by` text DEFAULT '[]' NOT NULL,
	`created_at` text NOT NULL,
	`updated_at` text NOT NULL,
	`submitted_at` text,
	`submitted_by` text,
	`answers` text NOT NULL,
	`findings` text,
	`document` text,
	`digest` text,
	`code` text,
	`released_at` text,
	`released_by` text,
	`ended_at` text,
	`ended_by` text,
	`ended_why` text,
	FOREIGN KEY (`card_id`) REFERENCES `cards`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`author_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`submitted_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`released_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`ended_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "card_revisions_state" CHECK("card_revisions"."state" in ('draft', 'in review', 'released', 'superseded', 'withdrawn')),
	CONSTRAINT "card_revisions_content" CHECK(json_valid("card_revisions"."content")),
	CONSTRAINT "card_revisions_frozen" CHECK("card_revisions"."state" not in ('released', 'superseded', 'withdrawn') or ("card_revisions"."document" is not null and "card_revisions"."digest" is not null and "card_revisions"."code" is not null)),
	CONSTRAINT "card_revisions_not_own" CHECK("card_revisions"."released_by" is null or "card_revisions"."released_by" <> "card_revisions"."author_id")
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `card_revisions_letter` ON `card_revisions` (`card_id`,`letter`);--> statement-breakpoint
CREATE UNIQUE INDEX `card_revisions_one_open` ON `card_revisions` (`card_id`) WHERE "card_revisions"."state" in ('draft', 'in review');--> statement-breakpoint
CREATE UNIQUE INDEX `card_revisions_one_released` ON `card_revisions` (`card_id`) WHERE "card_revisions"."state" = 'released';--> statement-breakpoint
CREATE UNIQUE INDEX `card_revisions_digest` ON `card_revisions` (`digest`);--> statement-breakpoint
CREATE UNIQUE INDEX `card_revisions_code` ON `card_revisions` (`code`);--> statement-breakpoint
CREATE TABLE `cards` (
	`id` text PRIMARY KEY NOT NULL,
	`programme_id` text NOT NULL,
	`number` text NOT NULL,
	`created_at` text NOT NULL,
	`created_by` text NOT NULL,
	FOREIGN KEY (`programme_id`) REFERENCES `programmes`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `cards_number` ON `cards` (`programme_id`,`number`);--> statement-breakpoint
CREATE TABLE `prints` (
	`id` text PRIMARY KEY NOT NULL,
	`revision_id` text NOT NULL,
	`paper` text NOT NULL,
	`state` text NOT NULL,
	`digest` text NOT NULL,
	`printed_by` text NOT NULL,
	`printed_at` text NOT NULL,
	FOREIGN KEY (`revision_id`) REFERENCES `card_revisions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`printed_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `prints_revision` ON `prints` (`revision_id`,`printed_at`);--> statement-breakpoint
CREATE TABLE `review_comments` (
	`id` text PRIMARY KEY NOT NULL,
	`revision_id` text NOT NULL,
	`point_id` text,
	`author_id` text NOT NULL,
	`text` text NOT NULL,
	`is_return` integer DEFAULT false NOT NULL,
	`created_at` text NOT NULL,
	FOREIGN KEY (`revision_id`) REFERENCES `card_revisions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`author_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `review_comments_revision` ON `review_comments` (`revision_id`,`created_at`);--> statement-breakpoint
CREATE TABLE `signatures` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`subject` text NOT NULL,
	`meaning` text NOT NULL,
	`digest` text NOT NULL,
	`signed_by` text NOT NULL,
	`name` text NOT NULL,
	`role` text NOT NULL,
	`signed_at` text NOT NULL,
	FOREIGN KEY (`signed_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `signatures_subject` ON `signatures` (`subject`);--> statement-breakpoint
CREATE TABLE `submissions` (
	`user_id` text NOT NULL,
	`key` text NOT NULL,
	`body_digest` text NOT NULL,
	`answer` text NOT NULL,
	`created_at` text NOT NULL,
	PRIMARY KEY(`user_id`, `key`)
) STRICT;
--> statement-breakpoint
CREATE TABLE `aircraft` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`registration` text NOT NULL,
	`type` text NOT NULL,
	`data` text NOT NULL,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "aircraft_data" CHECK(json_valid("aircraft"."data"))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `aircraft_registration` ON `aircraft` (`team_id`,`registration`);--> statement-breakpoint
CREATE TABLE `calibrations` (
	`id` text PRIMARY KEY NOT NULL,
	`instrument_id` text NOT NULL,
	`kind` text NOT NULL,
	`gain` real,
	`offset` real,
	`points` text,
	`low` real NOT NULL,
	`high` real NOT NULL,
	`expanded_uncertainty` real,
	`unit` text NOT NULL,
	`method` text NOT NULL,
	`reference` text NOT NULL,
	`calibrated_on` text NOT NULL,
	`valid_until` text NOT NULL,
	`disturbed_on` text,
	`created_at` text NOT NULL,
	`created_by` text,
	`superseded_at` text,
	FOREIGN KEY (`instrument_id`) REFERENCES `instruments`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "calibrations_range" CHECK("calibrations"."low" < "calibrations"."high"),
	CONSTRAINT "calibrations_shape" CHECK(("calibrations"."kind" = 'linear' and "calibrations"."gain" is not null and "calibrations"."offset" is not null) or ("calibrations"."kind" = 'points' and "calibrations"."points" is not null))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `calibrations_one_in_use` ON `calibrations` (`instrument_id`) WHERE "calibrations"."superseded_at" is null;--> statement-breakpoint
CREATE TABLE `configurations` (
	`id` text PRIMARY KEY NOT NULL,
	`programme_id` text NOT NULL,
	`number` text NOT NULL,
	`fitted` text NOT NULL,
	`details` text NOT NULL,
	`mass_kg` real NOT NULL,
	`arm_m` real NOT NULL,
	`is_current` integer DEFAULT false NOT NULL,
	`signed_by` text,
	`signed_at` text,
	`gaps_measured_on` text,
	`disturbed_on` text,
	`created_at` text NOT NULL,
	FOREIGN KEY (`programme_id`) REFERENCES `programmes`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`signed_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "configurations_signed" CHECK(("configurations"."signed_by" is null) = ("configurations"."signed_at" is null))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `configurations_number` ON `configurations` (`programme_id`,`number`);--> statement-breakpoint
CREATE UNIQUE INDEX `configurations_one_current` ON `configurations` (`programme_id`) WHERE "configurations"."is_current" = 1;--> statement-breakpoint
CREATE TABLE `hazards` (
	`id` text PRIMARY KEY NOT NULL,
	`programme_id` text NOT NULL,
	`code` text NOT NULL,
	`data` text NOT NULL,
	FOREIGN KEY (`programme_id`) REFERENCES `programmes`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "hazards_data" CHECK(json_valid("hazards"."data"))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `hazards_code` ON `hazards` (`programme_id`,`code`);--> statement-breakpoint
CREATE TABLE `instruments` (
	`id` text PRIMARY KEY NOT NULL,
	`programme_id` text NOT NULL,
	`parameter` text NOT NULL,
	`name` text NOT NULL,
	`gauge_name` text NOT NULL,
	`unit` text NOT NULL,
	`shown_on` text NOT NULL,
	`visible_to` text NOT NULL,
	`low` real NOT NULL,
	`high` real NOT NULL,
	`mark_spacing` real NOT NULL,
	`readable` real NOT NULL,
	`position` integer NOT NULL,
	FOREIGN KEY (`programme_id`) REFERENCES `programmes`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "instruments_range" CHECK("instruments"."low" < "instruments"."high"),
	CONSTRAINT "instruments_readable" CHECK("instruments"."readable" > 0 and "instruments"."mark_spacing" > 0),
	CONSTRAINT "instruments_shown_on" CHECK("instruments"."shown_on" in ('panel', 'repeater', 'recorder', 'hand held'))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `instruments_name` ON `instruments` (`programme_id`,`name`);--> statement-breakpoint
CREATE TABLE `limits` (
	`id` text PRIMARY KEY NOT NULL,
	`programme_id` text NOT NULL,
	`parameter` text NOT NULL,
	`side` text NOT NULL,
	`layer` text NOT NULL,
	`value` real NOT NULL,
	`unit` text NOT NULL,
	`applies_when` text NOT NULL,
	`for_s` real DEFAULT 0 NOT NULL,
	`statistic` text DEFAULT 'instant' NOT NULL,
	`source` text NOT NULL,
	`authority` text NOT NULL,
	`position` integer NOT NULL,
	FOREIGN KEY (`programme_id`) REFERENCES `programmes`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "limits_side" CHECK("limits"."side" in ('max', 'min')),
	CONSTRAINT "limits_layer" CHECK("limits"."layer" in ('placard', 'card')),
	CONSTRAINT "limits_applies_when" CHECK("limits"."applies_when" in ('always', 'at power', 'idle', 'take-off', 'full power', 'cold start')),
	CONSTRAINT "limits_statistic" CHECK("limits"."statistic" in ('instant', 'sustained', 'rate', 'spread', 'peak to peak', 'change from baseline')),
	CONSTRAINT "limits_for" CHECK("limits"."for_s" >= 0)
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `limits_one_a_layer` ON `limits` (`programme_id`,`parameter`,`side`,`layer`,`applies_when`,`statistic`);--> statement-breakpoint
CREATE TABLE `objectives` (
	`id` text PRIMARY KEY NOT NULL,
	`programme_id` text NOT NULL,
	`code` text NOT NULL,
	`question` text NOT NULL,
	`success` text NOT NULL,
	`priority` text NOT NULL,
	`requirement` text DEFAULT '' NOT NULL,
	FOREIGN KEY (`programme_id`) REFERENCES `programmes`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `objectives_code` ON `objectives` (`programme_id`,`code`);--> statement-breakpoint
CREATE TABLE `parameters` (
	`id` text PRIMARY KEY NOT NULL,
	`programme_id` text NOT NULL,
	`code` text NOT NULL,
	`name` text NOT NULL,
	`short_name` text NOT NULL,
	`unit` text NOT NULL,
	`group_name` text,
	`hot_day_rule` text NOT NULL,
	`normal` text,
	`safety` integer DEFAULT false NOT NULL,
	`stabilises` integer DEFAULT false NOT NULL,
	`standard_rate_per_min` text,
	`position` integer NOT NULL,
	FOREIGN KEY (`programme_id`) REFERENCES `programmes`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "parameters_hot_day_rule" CHECK("parameters"."hot_day_rule" in ('plus-one', 'barrel', 'ratio', 'none'))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `parameters_code` ON `parameters` (`programme_id`,`code`);--> statement-breakpoint
CREATE TABLE `programmes` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`aircraft_id` text NOT NULL,
	`name` text NOT NULL,
	`summary` text DEFAULT '' NOT NULL,
	`hot_day_basis` text,
	`settings` text NOT NULL,
	`created_at` text NOT NULL,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`aircraft_id`) REFERENCES `aircraft`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "programmes_basis" CHECK("programmes"."hot_day_basis" is null or "programmes"."hot_day_basis" in ('us', 'metric')),
	CONSTRAINT "programmes_settings" CHECK(json_valid("programmes"."settings"))
) STRICT;
--> statement-breakpoint
CREATE INDEX `programmes_team` ON `programmes` (`team_id`);--> statement-breakpoint
CREATE TABLE `step_decisions` (
	`id` text PRIMARY KEY NOT NULL,
	`programme_id` text NOT NULL,
	`test_point_code` text NOT NULL,
	`step` text NOT NULL,
	`series` text,
	`level` real,
	`measured` real,
	`expanded_uncertainty` real,
	`predicted` text,
	`computed` text NOT NULL,
	`decision` text NOT NULL,
	`because` text NOT NULL,
	`origin` text NOT NULL,
	`sortie_id` text,
	`proposed_by` text,
	`proposed_at` text,
	`countersigned_by` text,
	`countersigned_at` text,
	`position` integer NOT NULL,
	`created_at` text NOT NULL,
	FOREIGN KEY (`programme_id`) REFERENCES `programmes`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`proposed_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`countersigned_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "step_decisions_decision" CHECK("step_decisions"."decision" in ('clear to next step', 'smaller step', 'hold'))
) STRICT;
--> statement-breakpoint
CREATE INDEX `step_decisions_programme` ON `step_decisions` (`programme_id`,`position`);--> statement-breakpoint
CREATE TABLE `test_points` (
	`id` text PRIMARY KEY NOT NULL,
	`programme_id` text NOT NULL,
	`code` text NOT NULL,
	`revision` integer NOT NULL,
	`title` text NOT NULL,
	`content` text NOT NULL,
	`is_newest` integer NOT NULL,
	`position` integer NOT NULL,
	`created_at` text NOT NULL,
	FOREIGN KEY (`programme_id`) REFERENCES `programmes`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "test_points_content" CHECK(json_valid("test_points"."content"))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `test_points_revision` ON `test_points` (`programme_id`,`code`,`revision`);--> statement-breakpoint
CREATE UNIQUE INDEX `test_points_one_newest` ON `test_points` (`programme_id`,`code`) WHERE "test_points"."is_newest" = 1;--> statement-breakpoint
CREATE TABLE `check_reports` (
	`id` text PRIMARY KEY NOT NULL,
	`sortie_id` text NOT NULL,
	`revision_id` text NOT NULL,
	`version` integer NOT NULL,
	`core_version` text NOT NULL,
	`why` text NOT NULL,
	`report` text NOT NULL,
	`created_at` text NOT NULL,
	FOREIGN KEY (`sortie_id`) REFERENCES `sorties`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`revision_id`) REFERENCES `card_revisions`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "check_reports_report" CHECK(json_valid("check_reports"."report"))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `check_reports_version` ON `check_reports` (`sortie_id`,`revision_id`,`version`);--> statement-breakpoint
CREATE TABLE `debriefs` (
	`id` text PRIMARY KEY NOT NULL,
	`sortie_id` text NOT NULL,
	`content` text NOT NULL,
	`content_digest` text NOT NULL,
	`submitted_by` text NOT NULL,
	`submitted_at` text NOT NULL,
	`reviewed_at` text,
	`reviewed_by` text,
	FOREIGN KEY (`sortie_id`) REFERENCES `sorties`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`submitted_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`reviewed_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "debriefs_content" CHECK(json_valid("debriefs"."content"))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `debriefs_one_a_sortie` ON `debriefs` (`sortie_id`);--> statement-breakpoint
CREATE TABLE `point_dispositions` (
	`id` text PRIMARY KEY NOT NULL,
	`sortie_id` text NOT NULL,
	`revision_id` text NOT NULL,
	`point_id` text NOT NULL,
	`disposition` text NOT NULL,
	`why` text DEFAULT '' NOT NULL,
	`decided_by` text NOT NULL,
	`decided_at` text NOT NULL,
	`superseded_at` text,
	FOREIGN KEY (`sortie_id`) REFERENCES `sorties`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`revision_id`) REFERENCES `card_revisions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`decided_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "point_dispositions_disposition" CHECK("point_dispositions"."disposition" in ('accept', 'repeat', 'void')),
	CONSTRAINT "point_dispositions_why" CHECK("point_dispositions"."disposition" = 'accept' or length(trim("point_dispositions"."why")) > 0)
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `point_dispositions_one_in_force` ON `point_dispositions` (`sortie_id`,`revision_id`,`point_id`) WHERE "point_dispositions"."superseded_at" is null;--> statement-breakpoint
CREATE TABLE `sortie_cards` (
	`sortie_id` text NOT NULL,
	`position` integer NOT NULL,
	`revision_id` text NOT NULL,
	`answer` text,
	`answered_digest` text,
	`answered_by` text,
	`answered_at` text,
	`decline_why` text,
	PRIMARY KEY(`sortie_id`, `position`),
	FOREIGN KEY (`sortie_id`) REFERENCES `sorties`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`revision_id`) REFERENCES `card_revisions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`answered_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "sortie_cards_answer" CHECK(("sortie_cards"."answer" is null) = ("sortie_cards"."answered_digest" is null))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `sortie_cards_once` ON `sortie_cards` (`sortie_id`,`revision_id`);--> statement-breakpoint
CREATE INDEX `sortie_cards_revision` ON `sortie_cards` (`revision_id`);--> statement-breakpoint
CREATE TABLE `sortie_crew` (
	`sortie_id` text NOT NULL,
	`position` integer NOT NULL,
	`user_id` text,
	`name` text NOT NULL,
	`role` text NOT NULL,
	`mass_kg` integer NOT NULL,
	PRIMARY KEY(`sortie_id`, `position`),
	FOREIGN KEY (`sortie_id`) REFERENCES `sorties`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "sortie_crew_mass" CHECK("sortie_crew"."mass_kg" between 30 and 200)
) STRICT;
--> statement-breakpoint
CREATE TABLE `sorties` (
	`id` text PRIMARY KEY NOT NULL,
	`programme_id` text NOT NULL,
	`number` integer NOT NULL,
	`kind` text NOT NULL,
	`state` text NOT NULL,
	`planned_on` text NOT NULL,
	`configuration_id` text,
	`settings` text NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`planned_by` text NOT NULL,
	`created_at` text NOT NULL,
	`briefed_at` text,
	`briefed_by` text,
	`go_no_go` text,
	`answers` text DEFAULT '{}' NOT NULL,
	`closed_why` text,
	FOREIGN KEY (`programme_id`) REFERENCES `programmes`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`configuration_id`) REFERENCES `configurations`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`planned_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`briefed_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "sorties_kind" CHECK("sorties"."kind" in ('ground run', 'taxi', 'flight', 'inspection')),
	CONSTRAINT "sorties_state" CHECK("sorties"."state" in ('planned', 'briefed', 'flown', 'debriefed', 'closed'))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `sorties_number` ON `sorties` (`programme_id`,`number`);--> statement-breakpoint
CREATE INDEX `sorties_planned` ON `sorties` (`programme_id`,`planned_on`);--> statement-breakpoint
CREATE TABLE `squawks` (
	`id` text PRIMARY KEY NOT NULL,
	`programme_id` text NOT NULL,
	`number` integer NOT NULL,
	`system` text NOT NULL,
	`text` text NOT NULL,
	`severity` text NOT NULL,
	`state` text NOT NULL,
	`disposition` text,
	`sortie_id` text,
	`point_id` text,
	`reading_id` text,
	`raised_from` text NOT NULL,
	`raised_by` text,
	`raised_at` text NOT NULL,
	`closed_at` text,
	FOREIGN KEY (`programme_id`) REFERENCES `programmes`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`sortie_id`) REFERENCES `sorties`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`raised_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "squawks_severity" CHECK("squawks"."severity" in ('grounding', 'before next test', 'monitor')),
	CONSTRAINT "squawks_state" CHECK("squawks"."state" in ('open', 'assessed', 'dispositioned', 'verified', 'closed')),
	CONSTRAINT "squawks_disposition" CHECK("squawks"."disposition" is null or "squawks"."disposition" in ('rectified', 'no fault found', 'deferred with limit', 'accepted as is'))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `squawks_number` ON `squawks` (`programme_id`,`number`);--> statement-breakpoint
CREATE INDEX `squawks_open` ON `squawks` (`programme_id`,`state`,`severity`);--> statement-breakpoint
CREATE TABLE `member_roles` (
	`team_id` text NOT NULL,
	`user_id` text NOT NULL,
	`role` text NOT NULL,
	PRIMARY KEY(`team_id`, `user_id`, `role`),
	CONSTRAINT "member_roles_role" CHECK("member_roles"."role" in ('admin', 'engineer', 'reviewer', 'pilot', 'mechanic', 'observer'))
) STRICT;
--> statement-breakpoint
CREATE TABLE `memberships` (
	`team_id` text NOT NULL,
	`user_id` text NOT NULL,
	`residual_risk` text DEFAULT 'Medium' NOT NULL,
	`removed_at` text,
	PRIMARY KEY(`team_id`, `user_id`),
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "memberships_risk" CHECK("memberships"."residual_risk" in ('Eliminated', 'Low', 'Medium', 'Serious', 'High'))
) STRICT;
--> statement-breakpoint
CREATE INDEX `memberships_user` ON `memberships` (`user_id`);--> statement-breakpoint
CREATE TABLE `rate_limits` (
	`key` text PRIMARY KEY NOT NULL,
	`points` integer NOT NULL,
	`expire` integer
) STRICT;
--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`team_id` text NOT NULL,
	`created_at` text NOT NULL,
	`expires_at` text NOT NULL,
	`ended_at` text,
	`user_agent` text DEFAULT '' NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `sessions_user` ON `sessions` (`user_id`,`ended_at`);--> statement-breakpoint
CREATE TABLE `settings` (
	`key` text PRIMARY KEY NOT NULL,
	`value` text NOT NULL,
	`version` integer DEFAULT 1 NOT NULL
) STRICT;
--> statement-breakpoint
CREATE TABLE `teams` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`created_at` text NOT NULL
) STRICT;
--> statement-breakpoint
CREATE TABLE `users` (
	`id` text PRIMARY KEY NOT NULL,
	`email` text NOT NULL,
	`name` text NOT NULL,
	`password_hash` text NOT NULL,
	`created_at` text NOT NULL
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `users_email` ON `users` (`email`);