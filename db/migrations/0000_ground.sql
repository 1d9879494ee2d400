CREATE TABLE `accounts` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`account_id` varchar(255) NOT NULL,
	`provider_id` varchar(64) NOT NULL,
	`user_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`access_token` text,
	`refresh_token` text,
	`id_token` text,
	`access_token_expires_at` datetime(3),
	`refresh_token_expires_at` datetime(3),
	`scope` text,
	`password` text,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `accounts_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`user_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`token` varchar(255) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	`ip_address` varchar(64),
	`user_agent` text,
	CONSTRAINT `sessions_id` PRIMARY KEY(`id`),
	CONSTRAINT `sessions_token` UNIQUE(`token`)
);
--> statement-breakpoint
CREATE TABLE `users` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`email` varchar(254) NOT NULL,
	`email_verified` boolean NOT NULL DEFAULT false,
	`image` text,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	`site_admin` boolean NOT NULL DEFAULT false,
	`disabled_at` datetime(3),
	CONSTRAINT `users_id` PRIMARY KEY(`id`),
	CONSTRAINT `users_email` UNIQUE(`email`)
);
--> statement-breakpoint
CREATE TABLE `verifications` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`identifier` varchar(255) NOT NULL,
	`value` text NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `verifications_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `companies` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(200) NOT NULL,
	`name_key` varchar(200) NOT NULL,
	`mark` varchar(120) character set ascii collate ascii_bin,
	`phone` varchar(60),
	`payee_account` varchar(120) character set ascii collate ascii_bin,
	`merged_into_id` varchar(64) character set ascii collate ascii_bin,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `companies_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `case_counters` (
	`year` int NOT NULL,
	`last` int NOT NULL,
	CONSTRAINT `case_counters_year` PRIMARY KEY(`year`)
);
--> statement-breakpoint
CREATE TABLE `equipment` (
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`mark` varchar(12) NOT NULL,
	`number` varchar(12) NOT NULL,
	`f_end` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`shape` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`axles` int NOT NULL,
	`weight_lb` int,
	`model` varchar(200),
	`built_year` int,
	`brake_schedule` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`bearings` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`alignment` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`facts` json NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `equipment_move_id` PRIMARY KEY(`move_id`)
);
--> statement-breakpoint
CREATE TABLE `equipment_aliases` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`alias` varchar(40) NOT NULL,
	CONSTRAINT `equipment_aliases_id` PRIMARY KEY(`id`),
	CONSTRAINT `equipment_aliases_once` UNIQUE(`move_id`,`alias`)
);
--> statement-breakpoint
CREATE TABLE `legs` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` int NOT NULL,
	`carrier_name` varchar(200) NOT NULL,
	`carrier_mark` varchar(120) character set ascii collate ascii_bin,
	`carrier_company_id` varchar(64) character set ascii collate ascii_bin,
	`from_place` varchar(200) NOT NULL,
	`from_zone` varchar(60) NOT NULL,
	`to_place` varchar(200) NOT NULL,
	`to_zone` varchar(60) NOT NULL,
	`miles` int,
	`payer_name` varchar(200),
	`payer_company_id` varchar(64) character set ascii collate ascii_bin,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `legs_id` PRIMARY KEY(`id`),
	CONSTRAINT `legs_seq` UNIQUE(`move_id`,`seq`)
);
--> statement-breakpoint
CREATE TABLE `move_drafts` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`created_by` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`body` json NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `move_drafts_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `moves` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`case_number` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`owner_company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`state` enum('open','closed','cancelled') NOT NULL DEFAULT 'open',
	`stage` enum('opening','preparing','inspecting','billing','instructing','ready','moving','interchange','placed','restoring','closed','cancelled') NOT NULL DEFAULT 'opening',
	`origin_name` varchar(200) NOT NULL,
	`origin_place` varchar(200) NOT NULL,
	`origin_zone` varchar(60) NOT NULL,
	`destination_name` varchar(200) NOT NULL,
	`destination_place` varchar(200) NOT NULL,
	`destination_zone` varchar(60) NOT NULL,
	`wanted_from` date,
	`wanted_to` date,
	`note` text,
	`waiting_part` enum('owner','contractor','carrier','inspector','billing','desk','receiver','payer'),
	`waiting_leg_id` varchar(64) character set ascii collate ascii_bin,
	`waiting_company_id` varchar(64) character set ascii collate ascii_bin,
	`waiting_name` varchar(200),
	`waiting_for` enum('invite-contractor','name-payer','invite-payer','invite-carrier','invite-receiver','prepare','sign-prep','inspect','answer','look-at-answers','accept','quote','agree','pay','confirm-payment','instruct','release','prepare-coupled','pull','move-on','take-over','place','arrival','restore','close'),
	`waiting_count` int,
	`waiting_since` datetime(3),
	`progress_mil` int NOT NULL DEFAULT 0,
	`search_text` varchar(1000) NOT NULL,
	`opened_by` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`opened_at` datetime(3) NOT NULL,
	`closed_at` datetime(3),
	`cancelled_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `moves_id` PRIMARY KEY(`id`),
	CONSTRAINT `moves_case` UNIQUE(`case_number`)
);
--> statement-breakpoint
CREATE TABLE `waits` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`part` enum('owner','contractor','carrier','inspector','billing','desk','receiver','payer') NOT NULL,
	`leg_id` varchar(64) character set ascii collate ascii_bin,
	`name` varchar(200) NOT NULL,
	`waiting_for` enum('invite-contractor','name-payer','invite-payer','invite-carrier','invite-receiver','prepare','sign-prep','inspect','answer','look-at-answers','accept','quote','agree','pay','confirm-payment','instruct','release','prepare-coupled','pull','move-on','take-over','place','arrival','restore','close') NOT NULL,
	`since` datetime(3) NOT NULL,
	`until` datetime(3),
	CONSTRAINT `waits_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `company_members` (
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`user_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`manager` boolean NOT NULL DEFAULT false,
	`inspects` boolean NOT NULL DEFAULT false,
	`bills` boolean NOT NULL DEFAULT false,
	`dispatches` boolean NOT NULL DEFAULT false,
	`joined_at` datetime(3) NOT NULL,
	`admitted_at` datetime(3),
	`removed_at` datetime(3),
	CONSTRAINT `company_members_company_id_user_id_pk` PRIMARY KEY(`company_id`,`user_id`)
);
--> statement-breakpoint
CREATE TABLE `follow_links` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`label` varchar(200) NOT NULL,
	`email` varchar(254),
	`token_hash` char(64) character set ascii collate ascii_bin NOT NULL,
	`created_by` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`revoked_at` datetime(3),
	`last_used_at` datetime(3),
	`uses` int NOT NULL DEFAULT 0,
	CONSTRAINT `follow_links_id` PRIMARY KEY(`id`),
	CONSTRAINT `follow_links_token` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `invitations` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin,
	`seat_id` varchar(64) character set ascii collate ascii_bin,
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`email` varchar(254) NOT NULL,
	`name` varchar(200),
	`inspects` boolean NOT NULL DEFAULT false,
	`bills` boolean NOT NULL DEFAULT false,
	`dispatches` boolean NOT NULL DEFAULT false,
	`token_hash` char(64) character set ascii collate ascii_bin NOT NULL,
	`invited_by` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`accepted_at` datetime(3),
	`accepted_by` varchar(64) character set ascii collate ascii_bin,
	`revoked_at` datetime(3),
	CONSTRAINT `invitations_id` PRIMARY KEY(`id`),
	CONSTRAINT `invitations_token` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `move_seats` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`part` enum('owner','contractor','carrier','receiver','payer') NOT NULL,
	`leg_id` varchar(64) character set ascii collate ascii_bin,
	`leg_key` varchar(120) character set ascii collate ascii_bin NOT NULL DEFAULT '-',
	`created_at` datetime(3) NOT NULL,
	`removed_at` datetime(3),
	CONSTRAINT `move_seats_id` PRIMARY KEY(`id`),
	CONSTRAINT `move_seats_once` UNIQUE(`move_id`,`company_id`,`part`,`leg_key`)
);
--> statement-breakpoint
CREATE TABLE `seat_people` (
	`seat_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`user_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`inspects` boolean NOT NULL DEFAULT false,
	`bills` boolean NOT NULL DEFAULT false,
	`dispatches` boolean NOT NULL DEFAULT false,
	`joined_at` datetime(3) NOT NULL,
	`removed_at` datetime(3),
	CONSTRAINT `seat_people_seat_id_user_id_pk` PRIMARY KEY(`seat_id`,`user_id`)
);
--> statement-breakpoint
CREATE TABLE `record` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` int NOT NULL,
	`kind` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`by_user_id` varchar(64) character set ascii collate ascii_bin,
	`by_name` varchar(200) NOT NULL,
	`by_company_id` varchar(64) character set ascii collate ascii_bin,
	`by_company_name` varchar(200),
	`by_part` enum('owner','contractor','carrier','inspector','billing','desk','receiver','payer'),
	`leg_id` varchar(64) character set ascii collate ascii_bin,
	`entered_for` json,
	`detail` json NOT NULL,
	`at` datetime(3) NOT NULL,
	`previous` char(64) character set ascii collate ascii_bin NOT NULL,
	`hash` char(64) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `record_id` PRIMARY KEY(`id`),
	CONSTRAINT `record_seq` UNIQUE(`move_id`,`seq`)
);
--> statement-breakpoint
CREATE TABLE `signatures` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`kind` enum('prep-where-it-stands','prep-when-coupled','acceptance','release','arrival','closing') NOT NULL,
	`subject_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`user_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(200) NOT NULL,
	`statement` text NOT NULL,
	`rows_hash` char(64) character set ascii collate ascii_bin NOT NULL,
	`entered_for` json,
	`at` datetime(3) NOT NULL,
	`lifted_at` datetime(3),
	`lifted_why` varchar(200),
	CONSTRAINT `signatures_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `site_log` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`kind` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`by_user_id` varchar(64) character set ascii collate ascii_bin,
	`detail` json NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `site_log_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `attempts` (
	`user_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`key` varchar(80) NOT NULL,
	`door` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`body_hash` char(64) character set ascii collate ascii_bin NOT NULL,
	`answer` json,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `attempts_user_id_key_pk` PRIMARY KEY(`user_id`,`key`)
);
--> statement-breakpoint
CREATE TABLE `limit_counters` (
	`key` char(64) character set ascii collate ascii_bin NOT NULL,
	`window_ends_ms` bigint NOT NULL,
	`count` int NOT NULL,
	CONSTRAINT `limit_counters_key` PRIMARY KEY(`key`)
);
--> statement-breakpoint
CREATE TABLE `outbox` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`dedupe` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`kind` enum('verify-address','sign-in-link','reset-password','password-changed','invitation','finding-posted','finding-answered','finding-replied','acceptance-signed','quote-given','receipt','movement','follow-link','arrival','move-closed','check-photo','check-payment') NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin,
	`to_address` varchar(254),
	`payload` text NOT NULL,
	`message_id` varchar(200) NOT NULL,
	`state` enum('ready','taken','done','failed') NOT NULL DEFAULT 'ready',
	`run_at` datetime(3) NOT NULL,
	`lease_until` datetime(3),
	`attempts` int NOT NULL DEFAULT 0,
	`last_error` varchar(500),
	`created_at` datetime(3) NOT NULL,
	`done_at` datetime(3),
	CONSTRAINT `outbox_id` PRIMARY KEY(`id`),
	CONSTRAINT `outbox_dedupe` UNIQUE(`dedupe`)
);
--> statement-breakpoint
CREATE TABLE `photo_uses` (
	`photo_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`subject` enum('move','prep','restore','inspection','finding','finding-entry','sighting','arrival') NOT NULL,
	`subject_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `photo_uses_photo_id_subject_subject_id_pk` PRIMARY KEY(`photo_id`,`subject`,`subject_id`)
);
--> statement-breakpoint
CREATE TABLE `photos` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`client_id` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`taken_by` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(200) NOT NULL,
	`type` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`size_bytes` int NOT NULL,
	`sha256` char(64) character set ascii collate ascii_bin NOT NULL,
	`width_px` int,
	`height_px` int,
	`captured_at` datetime(3),
	`latitude` decimal(9,6),
	`longitude` decimal(9,6),
	`camera` varchar(200),
	`state` enum('registered','proof','kept','refused') NOT NULL DEFAULT 'registered',
	`refused_why` varchar(200),
	`proof_key` varchar(200),
	`original_key` varchar(200),
	`preview_key` varchar(200),
	`created_at` datetime(3) NOT NULL,
	`proof_at` datetime(3),
	`original_at` datetime(3),
	`kept_at` datetime(3),
	CONSTRAINT `photos_id` PRIMARY KEY(`id`),
	CONSTRAINT `photos_client` UNIQUE(`client_id`),
	CONSTRAINT `photos_proof` UNIQUE(`proof_key`),
	CONSTRAINT `photos_original` UNIQUE(`original_key`)
);
--> statement-breakpoint
CREATE TABLE `prep_items` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`template_id` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`item_group` enum('safety','power-plant','electrical','air-brakes','running-gear','draft','body','papers','when-coupled') NOT NULL,
	`phase` enum('where-it-stands','when-coupled') NOT NULL,
	`item_order` int NOT NULL,
	`action` text NOT NULL,
	`why` text NOT NULL,
	`caution` text,
	`needs_photo` boolean NOT NULL,
	`needs_tag` boolean NOT NULL,
	`value_label` varchar(200),
	`value_unit` varchar(20),
	`published` boolean NOT NULL,
	`state` enum('to-do','done','not-applicable') NOT NULL DEFAULT 'to-do',
	`value` varchar(200),
	`tag_number` varchar(40),
	`note` text,
	`skipped_why` varchar(200),
	`by_user_id` varchar(64) character set ascii collate ascii_bin,
	`by_name` varchar(200),
	`at` datetime(3),
	`restore_action` text,
	`restore_caution` text,
	`restore_order` int NOT NULL DEFAULT 0,
	`restore_state` enum('none','later','to-restore','restored','kept') NOT NULL DEFAULT 'none',
	`restore_note` text,
	`restored_by_user_id` varchar(64) character set ascii collate ascii_bin,
	`restored_by_name` varchar(200),
	`restored_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `prep_items_id` PRIMARY KEY(`id`),
	CONSTRAINT `prep_items_once` UNIQUE(`move_id`,`template_id`)
);
--> statement-breakpoint
CREATE TABLE `acceptances` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`leg_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`number` varchar(60),
	`restrictions` json NOT NULL,
	`restriction_note` text,
	`valid_until` date,
	`signature_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`at` datetime(3) NOT NULL,
	`withdrawn_at` datetime(3),
	`withdrawn_why` varchar(200),
	CONSTRAINT `acceptances_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `finding_entries` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`finding_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`round` int NOT NULL,
	`kind` enum('answer','not-cleared','cleared','withdrawn') NOT NULL,
	`text` text NOT NULL,
	`reading` varchar(60),
	`would_satisfy` text,
	`by_user_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`by_name` varchar(200) NOT NULL,
	`by_company_name` varchar(200) NOT NULL,
	`entered_for` json,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `finding_entries_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `findings` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`leg_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`inspection_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`number` int NOT NULL,
	`component_id` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`place_id` varchar(120) character set ascii collate ascii_bin,
	`place_note` varchar(200),
	`observed` text NOT NULL,
	`reading` varchar(60),
	`condition_text` varchar(200),
	`severity` enum('stops-move','answer-before-pickup','note') NOT NULL,
	`no_photo_reason` varchar(200),
	`state` enum('open','answered','cleared','withdrawn') NOT NULL DEFAULT 'open',
	`rounds` int NOT NULL DEFAULT 0,
	`by_user_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`by_name` varchar(200) NOT NULL,
	`entered_for` json,
	`at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `findings_id` PRIMARY KEY(`id`),
	CONSTRAINT `findings_number` UNIQUE(`move_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `inspections` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`leg_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`number` int NOT NULL,
	`visited_on` date NOT NULL,
	`place` varchar(200) NOT NULL,
	`zone` varchar(60) NOT NULL,
	`inspector_name` varchar(200) NOT NULL,
	`air` enum('on','off','not-said') NOT NULL,
	`air_source` varchar(200),
	`air_psi` int,
	`note` text,
	`by_user_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`entered_for` json,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `inspections_id` PRIMARY KEY(`id`),
	CONSTRAINT `inspections_number` UNIQUE(`leg_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `billing_clearances` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`leg_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`how` enum('paid','credit-agreed') NOT NULL,
	`note` varchar(200),
	`by_user_id` varchar(64) character set ascii collate ascii_bin,
	`entered_for` json,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `billing_clearances_id` PRIMARY KEY(`id`),
	CONSTRAINT `billing_clearances_leg` UNIQUE(`leg_id`)
);
--> statement-breakpoint
CREATE TABLE `fee_lines` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`quote_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`line_order` int NOT NULL,
	`kind` enum('inspection','line-haul','switching','special-handling','fuel','correction','storage','other') NOT NULL,
	`description` varchar(200) NOT NULL,
	`amount_cents` bigint NOT NULL,
	CONSTRAINT `fee_lines_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `ledger_postings` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`leg_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`group_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`account` enum('payer','payee','clearing','refunds') NOT NULL,
	`amount_cents` bigint NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `ledger_postings_id` PRIMARY KEY(`id`),
	CONSTRAINT `ledger_postings_once` UNIQUE(`group_id`,`account`)
);
--> statement-breakpoint
CREATE TABLE `payment_events` (
	`event_id` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`type` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`payment_id` varchar(64) character set ascii collate ascii_bin,
	`outcome` varchar(200) NOT NULL,
	`flagged` boolean NOT NULL DEFAULT false,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `payment_events_event_id` PRIMARY KEY(`event_id`)
);
--> statement-breakpoint
CREATE TABLE `payments` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`quote_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`attempt` int NOT NULL,
	`amount_cents` bigint NOT NULL,
	`state` enum('begun','open','paid','failed','expired','late') NOT NULL DEFAULT 'begun',
	`session_id` varchar(120) character set ascii collate ascii_bin,
	`session_url` varchar(1000),
	`intent_id` varchar(120) character set ascii collate ascii_bin,
	`begun_by` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`begun_at` datetime(3) NOT NULL,
	`expires_at` datetime(3),
	`paid_at` datetime(3),
	CONSTRAINT `payments_id` PRIMARY KEY(`id`),
	CONSTRAINT `payments_attempt` UNIQUE(`quote_id`,`attempt`),
	CONSTRAINT `payments_session` UNIQUE(`session_id`)
);
--> statement-breakpoint
CREATE TABLE `quotes` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`leg_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`number` int NOT NULL,
	`reference` varchar(200),
	`payer_company_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`total_cents` bigint NOT NULL,
	`note` text,
	`good_until` date,
	`state` enum('given','agreed','paid','voided') NOT NULL DEFAULT 'given',
	`entered_for` json,
	`given_by` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`given_at` datetime(3) NOT NULL,
	`agreed_by` varchar(64) character set ascii collate ascii_bin,
	`agreed_at` datetime(3),
	`voided_at` datetime(3),
	`voided_why` varchar(200),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `quotes_id` PRIMARY KEY(`id`),
	CONSTRAINT `quotes_number` UNIQUE(`leg_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `arrivals` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`arrived_on` date NOT NULL,
	`condition_text` text NOT NULL,
	`missing` text,
	`signature_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`by_user_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `arrivals_id` PRIMARY KEY(`id`),
	CONSTRAINT `arrivals_move` UNIQUE(`move_id`)
);
--> statement-breakpoint
CREATE TABLE `instructions` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`leg_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`bill_number` varchar(60) NOT NULL,
	`clearance_number` varchar(60),
	`train` varchar(40),
	`pickup_from` date,
	`text` text,
	`by_user_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`entered_for` json,
	`at` datetime(3) NOT NULL,
	`withdrawn_at` datetime(3),
	`withdrawn_why` varchar(200),
	CONSTRAINT `instructions_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `releases` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`leg_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`note` text,
	`signature_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `releases_id` PRIMARY KEY(`id`),
	CONSTRAINT `releases_leg` UNIQUE(`leg_id`)
);
--> statement-breakpoint
CREATE TABLE `sightings` (
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`move_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`leg_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`kind` enum('pulled','departed','arrived','delivered','received','at-destination','notified','placed','held','hold-released','bad-ordered','bad-order-released','set-out','stored','seen') NOT NULL,
	`place` varchar(200) NOT NULL,
	`zone` varchar(60) NOT NULL,
	`occurred_at` datetime(3) NOT NULL,
	`train` varchar(40),
	`note` text,
	`by_user_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`by_name` varchar(200) NOT NULL,
	`entered_for` json,
	`at` datetime(3) NOT NULL,
	`retracted_at` datetime(3),
	`retracted_why` varchar(200),
	`corrects` varchar(64) character set ascii collate ascii_bin,
	CONSTRAINT `sightings_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
ALTER TABLE `accounts` ADD CONSTRAINT `accounts_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sessions` ADD CONSTRAINT `sessions_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `equipment` ADD CONSTRAINT `equipment_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `equipment_aliases` ADD CONSTRAINT `equipment_aliases_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `legs` ADD CONSTRAINT `legs_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `legs` ADD CONSTRAINT `legs_carrier_company_id_companies_id_fk` FOREIGN KEY (`carrier_company_id`) REFERENCES `companies`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `legs` ADD CONSTRAINT `legs_payer_company_id_companies_id_fk` FOREIGN KEY (`payer_company_id`) REFERENCES `companies`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `move_drafts` ADD CONSTRAINT `move_drafts_company_id_companies_id_fk` FOREIGN KEY (`company_id`) REFERENCES `companies`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `move_drafts` ADD CONSTRAINT `move_drafts_created_by_users_id_fk` FOREIGN KEY (`created_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `moves` ADD CONSTRAINT `moves_owner_company_id_companies_id_fk` FOREIGN KEY (`owner_company_id`) REFERENCES `companies`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `moves` ADD CONSTRAINT `moves_opened_by_users_id_fk` FOREIGN KEY (`opened_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `waits` ADD CONSTRAINT `waits_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `company_members` ADD CONSTRAINT `company_members_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `follow_links` ADD CONSTRAINT `follow_links_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `follow_links` ADD CONSTRAINT `follow_links_created_by_users_id_fk` FOREIGN KEY (`created_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitations` ADD CONSTRAINT `invitations_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitations` ADD CONSTRAINT `invitations_seat_id_move_seats_id_fk` FOREIGN KEY (`seat_id`) REFERENCES `move_seats`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitations` ADD CONSTRAINT `invitations_invited_by_users_id_fk` FOREIGN KEY (`invited_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitations` ADD CONSTRAINT `invitations_accepted_by_users_id_fk` FOREIGN KEY (`accepted_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `move_seats` ADD CONSTRAINT `move_seats_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `move_seats` ADD CONSTRAINT `move_seats_leg_id_legs_id_fk` FOREIGN KEY (`leg_id`) REFERENCES `legs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `seat_people` ADD CONSTRAINT `seat_people_seat_id_move_seats_id_fk` FOREIGN KEY (`seat_id`) REFERENCES `move_seats`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `seat_people` ADD CONSTRAINT `seat_people_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `record` ADD CONSTRAINT `record_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `signatures` ADD CONSTRAINT `signatures_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `signatures` ADD CONSTRAINT `signatures_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `photo_uses` ADD CONSTRAINT `photo_uses_photo_id_photos_id_fk` FOREIGN KEY (`photo_id`) REFERENCES `photos`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `photo_uses` ADD CONSTRAINT `photo_uses_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `photos` ADD CONSTRAINT `photos_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `photos` ADD CONSTRAINT `photos_taken_by_users_id_fk` FOREIGN KEY (`taken_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `prep_items` ADD CONSTRAINT `prep_items_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `acceptances` ADD CONSTRAINT `acceptances_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `acceptances` ADD CONSTRAINT `acceptances_leg_id_legs_id_fk` FOREIGN KEY (`leg_id`) REFERENCES `legs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `finding_entries` ADD CONSTRAINT `finding_entries_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `finding_entries` ADD CONSTRAINT `finding_entries_finding_id_findings_id_fk` FOREIGN KEY (`finding_id`) REFERENCES `findings`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `findings` ADD CONSTRAINT `findings_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `findings` ADD CONSTRAINT `findings_leg_id_legs_id_fk` FOREIGN KEY (`leg_id`) REFERENCES `legs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `findings` ADD CONSTRAINT `findings_inspection_id_inspections_id_fk` FOREIGN KEY (`inspection_id`) REFERENCES `inspections`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `inspections` ADD CONSTRAINT `inspections_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `inspections` ADD CONSTRAINT `inspections_leg_id_legs_id_fk` FOREIGN KEY (`leg_id`) REFERENCES `legs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `billing_clearances` ADD CONSTRAINT `billing_clearances_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `billing_clearances` ADD CONSTRAINT `billing_clearances_leg_id_legs_id_fk` FOREIGN KEY (`leg_id`) REFERENCES `legs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `fee_lines` ADD CONSTRAINT `fee_lines_quote_id_quotes_id_fk` FOREIGN KEY (`quote_id`) REFERENCES `quotes`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ledger_postings` ADD CONSTRAINT `ledger_postings_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `ledger_postings` ADD CONSTRAINT `ledger_postings_leg_id_legs_id_fk` FOREIGN KEY (`leg_id`) REFERENCES `legs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `payments` ADD CONSTRAINT `payments_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `payments` ADD CONSTRAINT `payments_quote_id_quotes_id_fk` FOREIGN KEY (`quote_id`) REFERENCES `quotes`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `quotes` ADD CONSTRAINT `quotes_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `quotes` ADD CONSTRAINT `quotes_leg_id_legs_id_fk` FOREIGN KEY (`leg_id`) REFERENCES `legs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `quotes` ADD CONSTRAINT `quotes_payer_company_id_companies_id_fk` FOREIGN KEY (`payer_company_id`) REFERENCES `companies`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `arrivals` ADD CONSTRAINT `arrivals_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `instructions` ADD CONSTRAINT `instructions_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `instructions` ADD CONSTRAINT `instructions_leg_id_legs_id_fk` FOREIGN KEY (`leg_id`) REFERENCES `legs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `releases` ADD CONSTRAINT `releases_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `releases` ADD CONSTRAINT `releases_leg_id_legs_id_fk` FOREIGN KEY (`leg_id`) REFERENCES `legs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sightings` ADD CONSTRAINT `sightings_move_id_moves_id_fk` FOREIGN KEY (`move_id`) REFERENCES `moves`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sightings` ADD CONSTRAINT `sightings_leg_id_legs_id_fk` FOREIGN KEY (`leg_id`) REFERENCES `legs`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `accounts_user` ON `accounts` (`user_id`);--> statement-breakpoint
CREATE INDEX `sessions_user` ON `sessions` (`user_id`);--> statement-breakpoint
CREATE INDEX `verifications_identifier` ON `verifications` (`identifier`);--> statement-breakpoint
CREATE INDEX `companies_name` ON `companies` (`name_key`);--> statement-breakpoint
CREATE INDEX `move_drafts_company` ON `move_drafts` (`company_id`);--> statement-breakpoint
CREATE INDEX `moves_stage` ON `moves` (`state`,`stage`);--> statement-breakpoint
CREATE INDEX `moves_opened` ON `moves` (`opened_at`,`id`);--> statement-breakpoint
CREATE INDEX `waits_move` ON `waits` (`move_id`,`since`);--> statement-breakpoint
CREATE INDEX `company_members_user` ON `company_members` (`user_id`);--> statement-breakpoint
CREATE INDEX `follow_links_move` ON `follow_links` (`move_id`);--> statement-breakpoint
CREATE INDEX `invitations_move` ON `invitations` (`move_id`);--> statement-breakpoint
CREATE INDEX `invitations_email` ON `invitations` (`email`);--> statement-breakpoint
CREATE INDEX `move_seats_company` ON `move_seats` (`company_id`,`move_id`);--> statement-breakpoint
CREATE INDEX `seat_people_user` ON `seat_people` (`user_id`);--> statement-breakpoint
CREATE INDEX `signatures_move` ON `signatures` (`move_id`,`kind`);--> statement-breakpoint
CREATE INDEX `site_log_at` ON `site_log` (`at`);--> statement-breakpoint
CREATE INDEX `attempts_at` ON `attempts` (`at`);--> statement-breakpoint
CREATE INDEX `outbox_open` ON `outbox` (`state`,`run_at`);--> statement-breakpoint
CREATE INDEX `outbox_move` ON `outbox` (`move_id`);--> statement-breakpoint
CREATE INDEX `photo_uses_subject` ON `photo_uses` (`subject`,`subject_id`);--> statement-breakpoint
CREATE INDEX `photos_move` ON `photos` (`move_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `photos_state` ON `photos` (`state`,`created_at`);--> statement-breakpoint
CREATE INDEX `acceptances_leg` ON `acceptances` (`leg_id`,`withdrawn_at`);--> statement-breakpoint
CREATE INDEX `finding_entries_finding` ON `finding_entries` (`finding_id`,`at`);--> statement-breakpoint
CREATE INDEX `findings_leg` ON `findings` (`leg_id`,`state`);--> statement-breakpoint
CREATE INDEX `inspections_move` ON `inspections` (`move_id`);--> statement-breakpoint
CREATE INDEX `fee_lines_quote` ON `fee_lines` (`quote_id`);--> statement-breakpoint
CREATE INDEX `ledger_postings_leg` ON `ledger_postings` (`leg_id`);--> statement-breakpoint
CREATE INDEX `payment_events_payment` ON `payment_events` (`payment_id`);--> statement-breakpoint
CREATE INDEX `payments_state` ON `payments` (`state`,`begun_at`);--> statement-breakpoint
CREATE INDEX `payments_intent` ON `payments` (`intent_id`);--> statement-breakpoint
CREATE INDEX `quotes_move` ON `quotes` (`move_id`);--> statement-breakpoint
CREATE INDEX `instructions_leg` ON `instructions` (`leg_id`,`withdrawn_at`);--> statement-breakpoint
CREATE INDEX `sightings_move` ON `sightings` (`move_id`,`occurred_at`);--> statement-breakpoint
CREATE INDEX `sightings_leg` ON `sightings` (`leg_id`,`kind`);