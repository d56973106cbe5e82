CREATE TABLE `audit_lines` (
	`position` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`team_id` text NOT NULL,
	`person_id` text NOT NULL,
	`at` integer NOT NULL,
	`verb` text NOT NULL,
	`subject` text NOT NULL,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `audit_lines_team` ON `audit_lines` (`team_id`,`at`);--> statement-breakpoint
CREATE TABLE `files` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`name` text NOT NULL,
	`bytes` blob NOT NULL,
	`byte_length` integer NOT NULL,
	`sha256` text NOT NULL,
	`created_at` integer NOT NULL,
	`created_by_id` text NOT NULL,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `files_team` ON `files` (`team_id`);--> statement-breakpoint
CREATE TABLE `fits` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`scan_id` text NOT NULL,
	`stopping_set_id` text NOT NULL,
	`parent_fit_id` text,
	`name` text NOT NULL,
	`notes` text NOT NULL,
	`state` text NOT NULL,
	`observable` text NOT NULL,
	`profile` text NOT NULL,
	`spec` text NOT NULL,
	`points` text NOT NULL,
	`answer` text NOT NULL,
	`carrier_profile` text NOT NULL,
	`checks` text NOT NULL,
	`edge` text,
	`width` text,
	`chi_square` real NOT NULL,
	`degrees_of_freedom` integer NOT NULL,
	`aicc` real,
	`scan_points_sha256` text NOT NULL,
	`points_sha256` text NOT NULL,
	`stopping_set_sha256` text NOT NULL,
	`inputs_sha256` text NOT NULL,
	`created_at` integer NOT NULL,
	`created_by_id` text NOT NULL,
	`submitted_at` integer,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`scan_id`) REFERENCES `scans`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`stopping_set_id`) REFERENCES `stopping_sets`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`parent_fit_id`) REFERENCES `fits`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "fits_state" CHECK("fits"."state" in ('draft', 'submitted', 'accepted', 'returned'))
);
--> statement-breakpoint
CREATE INDEX `fits_team_state` ON `fits` (`team_id`,`state`);--> statement-breakpoint
CREATE INDEX `fits_scan` ON `fits` (`scan_id`);--> statement-breakpoint
CREATE INDEX `fits_parent` ON `fits` (`parent_fit_id`);--> statement-breakpoint
CREATE TABLE `invitations` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`email` text NOT NULL,
	`role` text NOT NULL,
	`token_sha256` text NOT NULL,
	`created_by_id` text NOT NULL,
	`created_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`accepted_at` integer,
	`cancelled_at` integer,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "invitations_role" CHECK("invitations"."role" in ('owner', 'analyst', 'reviewer', 'modeller'))
);
--> statement-breakpoint
CREATE UNIQUE INDEX `invitations_token` ON `invitations` (`token_sha256`);--> statement-breakpoint
CREATE INDEX `invitations_team` ON `invitations` (`team_id`);--> statement-breakpoint
CREATE TABLE `issued_profiles` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`fit_id` text NOT NULL,
	`year` integer NOT NULL,
	`sequence` integer NOT NULL,
	`number` text NOT NULL,
	`issued_at` integer NOT NULL,
	`issued_by_id` text NOT NULL,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`fit_id`) REFERENCES `fits`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`issued_by_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `issued_profiles_number` ON `issued_profiles` (`team_id`,`year`,`sequence`);--> statement-breakpoint
CREATE UNIQUE INDEX `issued_profiles_fit` ON `issued_profiles` (`fit_id`);--> statement-breakpoint
CREATE TABLE `memberships` (
	`team_id` text NOT NULL,
	`user_id` text NOT NULL,
	`role` text NOT NULL,
	`joined_at` integer NOT NULL,
	PRIMARY KEY(`team_id`, `user_id`),
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "memberships_role" CHECK("memberships"."role" in ('owner', 'analyst', 'reviewer', 'modeller'))
);
--> statement-breakpoint
CREATE INDEX `memberships_user` ON `memberships` (`user_id`);--> statement-breakpoint
CREATE TABLE `profile_exports` (
	`id` text PRIMARY KEY NOT NULL,
	`issued_profile_id` text NOT NULL,
	`person_id` text NOT NULL,
	`at` integer NOT NULL,
	`grid` text NOT NULL,
	FOREIGN KEY (`issued_profile_id`) REFERENCES `issued_profiles`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `profile_exports_profile` ON `profile_exports` (`issued_profile_id`);--> statement-breakpoint
CREATE TABLE `review_events` (
	`position` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`id` text NOT NULL,
	`fit_id` text NOT NULL,
	`kind` text NOT NULL,
	`body` text NOT NULL,
	`target` text NOT NULL,
	`person_id` text NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`fit_id`) REFERENCES `fits`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "review_events_kind" CHECK("review_events"."kind" in ('submitted', 'accepted', 'returned', 'comment'))
);
--> statement-breakpoint
CREATE UNIQUE INDEX `review_events_id_unique` ON `review_events` (`id`);--> statement-breakpoint
CREATE INDEX `review_events_fit` ON `review_events` (`fit_id`);--> statement-breakpoint
CREATE TABLE `samples` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`name` text NOT NULL,
	`material` text NOT NULL,
	`carrier` text NOT NULL,
	`doping_per_cm3` real,
	`doping_sigma_per_cm3` real,
	`cap_material` text NOT NULL,
	`cap_thickness_nm` real,
	`treatment` text NOT NULL,
	`notes` text NOT NULL,
	`invented` integer DEFAULT false NOT NULL,
	`archived_at` integer,
	`created_at` integer NOT NULL,
	`created_by_id` text NOT NULL,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "samples_carrier" CHECK("samples"."carrier" in ('electrons', 'holes'))
);
--> statement-breakpoint
CREATE INDEX `samples_team` ON `samples` (`team_id`);--> statement-breakpoint
CREATE TABLE `scans` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`sample_id` text NOT NULL,
	`name` text NOT NULL,
	`observable` text NOT NULL,
	`temperature_k` real,
	`field_mt` real,
	`illumination` text NOT NULL,
	`measured_on` text NOT NULL,
	`notes` text NOT NULL,
	`points` text NOT NULL,
	`points_sha256` text NOT NULL,
	`asymmetry_scale_error` real,
	`file_id` text,
	`reading` text,
	`invented` integer DEFAULT false NOT NULL,
	`archived_at` integer,
	`created_at` integer NOT NULL,
	`created_by_id` text NOT NULL,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`sample_id`) REFERENCES `samples`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`file_id`) REFERENCES `files`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "scans_observable" CHECK("scans"."observable" in ('fraction', 'rate')),
	CONSTRAINT "scans_illumination" CHECK("scans"."illumination" in ('dark', 'illuminated', 'after illumination'))
);
--> statement-breakpoint
CREATE INDEX `scans_team` ON `scans` (`team_id`);--> statement-breakpoint
CREATE INDEX `scans_sample` ON `scans` (`sample_id`);--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`expires_at` integer NOT NULL,
	`created_at` integer NOT NULL,
	`device` text NOT NULL,
	`team_id` text,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `sessions_user` ON `sessions` (`user_id`);--> statement-breakpoint
CREATE TABLE `stopping_files` (
	`stopping_set_id` text NOT NULL,
	`position` integer NOT NULL,
	`file_id` text NOT NULL,
	PRIMARY KEY(`stopping_set_id`, `position`),
	FOREIGN KEY (`stopping_set_id`) REFERENCES `stopping_sets`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`file_id`) REFERENCES `files`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `stopping_profiles` (
	`stopping_set_id` text NOT NULL,
	`energy_kev` real NOT NULL,
	`edges_nm` blob NOT NULL,
	`mass` blob NOT NULL,
	`lost_share` real,
	PRIMARY KEY(`stopping_set_id`, `energy_kev`),
	FOREIGN KEY (`stopping_set_id`) REFERENCES `stopping_sets`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `stopping_sets` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`name` text NOT NULL,
	`layer_stack` text NOT NULL,
	`origin` text NOT NULL,
	`notes` text NOT NULL,
	`energies_kev` text NOT NULL,
	`bins` integer NOT NULL,
	`warnings` text NOT NULL,
	`reading` text NOT NULL,
	`sha256` text NOT NULL,
	`invented` integer DEFAULT false NOT NULL,
	`archived_at` integer,
	`created_at` integer NOT NULL,
	`created_by_id` text NOT NULL,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `stopping_sets_team` ON `stopping_sets` (`team_id`);--> statement-breakpoint
CREATE TABLE `teams` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`invented` integer DEFAULT false NOT NULL,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE `users` (
	`id` text PRIMARY KEY NOT NULL,
	`email` text NOT NULL,
	`name` text NOT NULL,
	`password_hash` text NOT NULL,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `users_email` ON `users` (`email`);