CREATE TABLE `email_tokens` (
	`token_hash` binary(32) NOT NULL,
	`purpose` varchar(16) character set ascii collate ascii_bin NOT NULL,
	`email` varchar(254) NOT NULL,
	`user_id` binary(16),
	`laboratory_id` binary(16),
	`payload` json NOT NULL,
	`created_by` binary(16),
	`created_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`used_at` datetime(3),
	CONSTRAINT `email_tokens_token_hash` PRIMARY KEY(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `membership_roles` (
	`laboratory_id` binary(16) NOT NULL,
	`user_id` binary(16) NOT NULL,
	`role` varchar(12) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `membership_roles_laboratory_id_user_id_role_pk` PRIMARY KEY(`laboratory_id`,`user_id`,`role`)
);
--> statement-breakpoint
CREATE TABLE `memberships` (
	`laboratory_id` binary(16) NOT NULL,
	`user_id` binary(16) NOT NULL,
	`title` varchar(120) NOT NULL DEFAULT '',
	`joined_at` datetime(3) NOT NULL,
	`ended_at` datetime(3),
	CONSTRAINT `memberships_laboratory_id_user_id_pk` PRIMARY KEY(`laboratory_id`,`user_id`)
);
--> statement-breakpoint
CREATE TABLE `rate_limits` (
	`key` varchar(255) character set ascii collate ascii_bin NOT NULL,
	`points` int NOT NULL DEFAULT 0,
	`expire` bigint,
	CONSTRAINT `rate_limits_key` PRIMARY KEY(`key`)
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`token_hash` binary(32) NOT NULL,
	`user_id` binary(16),
	`data` json NOT NULL,
	`user_agent` varchar(255) NOT NULL DEFAULT '',
	`created_at` datetime(3) NOT NULL,
	`last_seen_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	CONSTRAINT `sessions_token_hash` PRIMARY KEY(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `users` (
	`id` binary(16) NOT NULL,
	`email` varchar(254) NOT NULL,
	`name` varchar(120) NOT NULL,
	`password_hash` varchar(80) character set ascii collate ascii_bin,
	`password_changed_at` datetime(3),
	`email_confirmed_at` datetime(3),
	`is_demonstration` boolean NOT NULL DEFAULT false,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `users_id` PRIMARY KEY(`id`),
	CONSTRAINT `users_email` UNIQUE(`email`)
);
--> statement-breakpoint
CREATE TABLE `attachments` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`item_id` binary(16) NOT NULL,
	`stone_id` binary(16),
	`caption` varchar(200) NOT NULL DEFAULT '',
	`file_key` varchar(160) character set ascii collate ascii_bin NOT NULL,
	`source_key` varchar(160) character set ascii collate ascii_bin NOT NULL,
	`mime_type` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`width_px` int NOT NULL,
	`height_px` int NOT NULL,
	`size_bytes` int NOT NULL,
	`sha256` binary(32) NOT NULL,
	`thumbnail` mediumblob NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`created_by` binary(16) NOT NULL,
	CONSTRAINT `attachments_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `attachments_source` UNIQUE(`laboratory_id`,`source_key`)
);
--> statement-breakpoint
CREATE TABLE `client_users` (
	`laboratory_id` binary(16) NOT NULL,
	`client_id` binary(16) NOT NULL,
	`user_id` binary(16) NOT NULL,
	`joined_at` datetime(3) NOT NULL,
	CONSTRAINT `client_users_laboratory_id_client_id_user_id_pk` PRIMARY KEY(`laboratory_id`,`client_id`,`user_id`)
);
--> statement-breakpoint
CREATE TABLE `clients` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`name` varchar(120) NOT NULL,
	`contact_name` varchar(120) NOT NULL DEFAULT '',
	`email` varchar(254) NOT NULL DEFAULT '',
	`phone` varchar(40) NOT NULL DEFAULT '',
	`address_lines` json NOT NULL,
	`note` varchar(2000) NOT NULL DEFAULT '',
	`terms` varchar(8) character set ascii collate ascii_bin NOT NULL DEFAULT 'prepaid',
	`terms_granted_by` binary(16),
	`terms_granted_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `clients_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `conclusions` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`stone_id` binary(16) NOT NULL,
	`version` int NOT NULL,
	`species_id` varchar(60) character set ascii collate ascii_bin,
	`species_name` varchar(120) NOT NULL,
	`variety` varchar(120) NOT NULL,
	`nature` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`nature_evidence` varchar(1000) NOT NULL,
	`confidence` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`treatments` json NOT NULL,
	`evidence` varchar(2000) NOT NULL,
	`limits` json NOT NULL,
	`rejected` json NOT NULL,
	`contradictions_explained` varchar(2000) NOT NULL DEFAULT '',
	`description` json NOT NULL,
	`reasoning` text NOT NULL,
	`ranking` json NOT NULL,
	`species_table_version` varchar(24) character set ascii collate ascii_bin NOT NULL,
	`model_version` varchar(24) character set ascii collate ascii_bin NOT NULL,
	`concluded_at` datetime(3) NOT NULL,
	`concluded_by` binary(16) NOT NULL,
	CONSTRAINT `conclusions_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `conclusions_version` UNIQUE(`laboratory_id`,`stone_id`,`version`)
);
--> statement-breakpoint
CREATE TABLE `second_checks` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`stone_id` binary(16) NOT NULL,
	`conclusion_id` binary(16) NOT NULL,
	`kind` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`checker_id` binary(16) NOT NULL,
	`started_at` datetime(3) NOT NULL,
	`compared_at` datetime(3),
	`own_species` varchar(120) NOT NULL DEFAULT '',
	`own_nature` varchar(20) character set ascii collate ascii_bin,
	`outcome` varchar(10) character set ascii collate ascii_bin,
	`reason` varchar(1000) NOT NULL DEFAULT '',
	`decided_at` datetime(3),
	CONSTRAINT `second_checks_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `second_checks_conclusion` UNIQUE(`laboratory_id`,`conclusion_id`)
);
--> statement-breakpoint
CREATE TABLE `instrument_checks` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`instrument_id` binary(16) NOT NULL,
	`reference_material` varchar(120) NOT NULL,
	`nominal_value` decimal(14,6) NOT NULL,
	`reading_value` decimal(14,6) NOT NULL,
	`reading_text` varchar(24) NOT NULL,
	`limit_value` decimal(14,6) NOT NULL,
	`is_passed` boolean NOT NULL,
	`temp_c` decimal(5,1),
	`note` varchar(500) NOT NULL DEFAULT '',
	`next_due_on` date NOT NULL,
	`checked_at` datetime(3) NOT NULL,
	`checked_by` binary(16) NOT NULL,
	CONSTRAINT `instrument_checks_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `instruments` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`kind` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(40) NOT NULL,
	`description` varchar(200) NOT NULL DEFAULT '',
	`serial` varchar(80) NOT NULL DEFAULT '',
	`location` varchar(80) NOT NULL DEFAULT '',
	`status` varchar(12) character set ascii collate ascii_bin NOT NULL DEFAULT 'inService',
	`status_reason` varchar(300) NOT NULL DEFAULT '',
	`resolution` decimal(12,6),
	`standard_uncertainty` decimal(12,6),
	`upper_limit` decimal(12,6),
	`prism_index` decimal(12,6),
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `instruments_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `instruments_name` UNIQUE(`laboratory_id`,`name`)
);
--> statement-breakpoint
CREATE TABLE `invoice_lines` (
	`laboratory_id` binary(16) NOT NULL,
	`invoice_id` binary(16) NOT NULL,
	`position` smallint NOT NULL,
	`service` varchar(16) character set ascii collate ascii_bin NOT NULL,
	`label` varchar(160) NOT NULL,
	`quantity` smallint NOT NULL,
	`unit_minor` bigint NOT NULL,
	`net_minor` bigint NOT NULL,
	`tax_share_e4` int NOT NULL,
	`tax_minor` bigint NOT NULL,
	CONSTRAINT `invoice_lines_laboratory_id_invoice_id_position_pk` PRIMARY KEY(`laboratory_id`,`invoice_id`,`position`)
);
--> statement-breakpoint
CREATE TABLE `invoices` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`number` varchar(24) character set ascii collate ascii_bin NOT NULL,
	`take_in_id` binary(16) NOT NULL,
	`client_id` binary(16) NOT NULL,
	`state` varchar(10) character set ascii collate ascii_bin NOT NULL,
	`currency` varchar(3) character set ascii collate ascii_bin NOT NULL,
	`net_minor` bigint NOT NULL,
	`tax_minor` bigint NOT NULL,
	`total_minor` bigint NOT NULL,
	`issued_on` date NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`created_by` binary(16) NOT NULL,
	`sent_at` datetime(3),
	`paid_at` datetime(3),
	`voided_at` datetime(3),
	`void_reason` varchar(300) NOT NULL DEFAULT '',
	`pay_token` varchar(43) character set ascii collate ascii_bin NOT NULL,
	`checkout_session_id` varchar(128) character set ascii collate ascii_bin,
	`checkout_attempt` int NOT NULL DEFAULT 0,
	CONSTRAINT `invoices_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `invoices_number` UNIQUE(`laboratory_id`,`number`),
	CONSTRAINT `invoices_pay_token` UNIQUE(`pay_token`)
);
--> statement-breakpoint
CREATE TABLE `payments` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`invoice_id` binary(16) NOT NULL,
	`kind` varchar(8) character set ascii collate ascii_bin NOT NULL,
	`method` varchar(10) character set ascii collate ascii_bin NOT NULL,
	`amount_minor` bigint NOT NULL,
	`currency` varchar(3) character set ascii collate ascii_bin NOT NULL,
	`reference` varchar(128) character set ascii collate ascii_bin NOT NULL,
	`received_at` datetime(3) NOT NULL,
	`recorded_by` binary(16),
	CONSTRAINT `payments_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `payments_reference` UNIQUE(`laboratory_id`,`kind`,`reference`)
);
--> statement-breakpoint
CREATE TABLE `prices` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`service` varchar(16) character set ascii collate ascii_bin NOT NULL,
	`label` varchar(120) NOT NULL,
	`amount_minor` bigint NOT NULL,
	`is_active` boolean NOT NULL DEFAULT true,
	`position` smallint NOT NULL,
	`changed_at` datetime(3) NOT NULL,
	`changed_by` binary(16),
	CONSTRAINT `prices_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `prices_service` UNIQUE(`laboratory_id`,`service`)
);
--> statement-breakpoint
CREATE TABLE `provider_events` (
	`event_id` varchar(128) character set ascii collate ascii_bin NOT NULL,
	`type` varchar(80) character set ascii collate ascii_bin NOT NULL,
	`object_id` varchar(128) character set ascii collate ascii_bin NOT NULL,
	`laboratory_id` binary(16),
	`effect` varchar(200) NOT NULL,
	`received_at` datetime(3) NOT NULL,
	CONSTRAINT `provider_events_event_id` PRIMARY KEY(`event_id`)
);
--> statement-breakpoint
CREATE TABLE `laboratories` (
	`id` binary(16) NOT NULL,
	`slug` varchar(60) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`prefix` varchar(6) character set ascii collate ascii_bin NOT NULL,
	`is_sole_practice` boolean NOT NULL,
	`time_zone` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`currency` varchar(3) character set ascii collate ascii_bin NOT NULL,
	`address_lines` json NOT NULL,
	`phone` varchar(40) NOT NULL DEFAULT '',
	`email` varchar(254) NOT NULL DEFAULT '',
	`tax_share_e4` int NOT NULL DEFAULT 0,
	`tax_label` varchar(40) NOT NULL DEFAULT 'Tax',
	`usual_days` smallint NOT NULL DEFAULT 5,
	`self_check_delay_hours` smallint NOT NULL DEFAULT 24,
	`custody_limit_minor` bigint,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `laboratories_id` PRIMARY KEY(`id`),
	CONSTRAINT `laboratories_slug` UNIQUE(`slug`),
	CONSTRAINT `laboratories_prefix` UNIQUE(`prefix`)
);
--> statement-breakpoint
CREATE TABLE `series_counters` (
	`laboratory_id` binary(16) NOT NULL,
	`series` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`year` smallint NOT NULL,
	`last_value` int NOT NULL,
	CONSTRAINT `series_counters_laboratory_id_series_year_pk` PRIMARY KEY(`laboratory_id`,`series`,`year`)
);
--> statement-breakpoint
CREATE TABLE `observation_strikes` (
	`laboratory_id` binary(16) NOT NULL,
	`observation_id` binary(16) NOT NULL,
	`reason` varchar(500) NOT NULL,
	`struck_at` datetime(3) NOT NULL,
	`struck_by` binary(16) NOT NULL,
	CONSTRAINT `observation_strikes_laboratory_id_observation_id_pk` PRIMARY KEY(`laboratory_id`,`observation_id`)
);
--> statement-breakpoint
CREATE TABLE `observation_values` (
	`laboratory_id` binary(16) NOT NULL,
	`observation_id` binary(16) NOT NULL,
	`name` varchar(24) character set ascii collate ascii_bin NOT NULL,
	`value` decimal(16,7) NOT NULL,
	`typed_text` varchar(24) NOT NULL DEFAULT '',
	`unit` varchar(8) character set ascii collate ascii_bin NOT NULL,
	`standard_uncertainty` decimal(16,7),
	`formula` varchar(60),
	CONSTRAINT `observation_values_laboratory_id_observation_id_name_pk` PRIMARY KEY(`laboratory_id`,`observation_id`,`name`)
);
--> statement-breakpoint
CREATE TABLE `observations` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`stone_id` binary(16) NOT NULL,
	`sequence` int NOT NULL,
	`kind` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`second_check_id` binary(16),
	`instrument_id` binary(16),
	`instrument_check_id` binary(16),
	`observer_id` binary(16) NOT NULL,
	`observed_at` datetime(3) NOT NULL,
	`recorded_at` datetime(3) NOT NULL,
	`detail` json NOT NULL,
	`quality` varchar(10) character set ascii collate ascii_bin NOT NULL,
	`no_result_reason` varchar(200) NOT NULL DEFAULT '',
	`note` varchar(2000) NOT NULL DEFAULT '',
	`is_blind` boolean NOT NULL,
	`request_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `observations_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `observations_sequence` UNIQUE(`laboratory_id`,`stone_id`,`sequence`),
	CONSTRAINT `observations_request` UNIQUE(`laboratory_id`,`request_id`)
);
--> statement-breakpoint
CREATE TABLE `audit_events` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`at` datetime(3) NOT NULL,
	`actor_id` binary(16),
	`action` varchar(48) character set ascii collate ascii_bin NOT NULL,
	`subject_kind` varchar(24) character set ascii collate ascii_bin NOT NULL,
	`subject_id` binary(16) NOT NULL,
	`detail` json NOT NULL,
	`reason` text NOT NULL,
	CONSTRAINT `audit_events_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `outgoing_mail` (
	`id` binary(16) NOT NULL,
	`laboratory_id` binary(16),
	`to_address` varchar(254) NOT NULL,
	`to_name` varchar(120) NOT NULL DEFAULT '',
	`kind` varchar(32) character set ascii collate ascii_bin NOT NULL,
	`dedupe_key` varchar(120) character set ascii collate ascii_bin NOT NULL,
	`subject` varchar(255) NOT NULL,
	`html_body` mediumtext NOT NULL,
	`text_body` mediumtext NOT NULL,
	`state` varchar(8) character set ascii collate ascii_bin NOT NULL,
	`attempts` int NOT NULL DEFAULT 0,
	`next_attempt_at` datetime(3) NOT NULL,
	`lease_until` datetime(3),
	`last_error` varchar(500) NOT NULL DEFAULT '',
	`created_at` datetime(3) NOT NULL,
	`sent_at` datetime(3),
	CONSTRAINT `outgoing_mail_id` PRIMARY KEY(`id`),
	CONSTRAINT `outgoing_mail_dedupe` UNIQUE(`dedupe_key`)
);
--> statement-breakpoint
CREATE TABLE `register_entries` (
	`code` varchar(16) character set ascii collate ascii_bin NOT NULL,
	`laboratory_id` binary(16) NOT NULL,
	`report_id` binary(16) NOT NULL,
	`state` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`view` json NOT NULL,
	`pdf_sha256` binary(32) NOT NULL,
	`issued_at` datetime(3) NOT NULL,
	`superseded_by_number` varchar(24) character set ascii collate ascii_bin,
	`superseded_by_code` varchar(16) character set ascii collate ascii_bin,
	`withdrawn_at` datetime(3),
	`withdrawal_reason` varchar(16) character set ascii collate ascii_bin,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `register_entries_code` PRIMARY KEY(`code`),
	CONSTRAINT `register_entries_report` UNIQUE(`laboratory_id`,`report_id`)
);
--> statement-breakpoint
CREATE TABLE `register_photos` (
	`laboratory_id` binary(16) NOT NULL,
	`report_id` binary(16) NOT NULL,
	`jpeg` mediumblob NOT NULL,
	CONSTRAINT `register_photos_laboratory_id_report_id_pk` PRIMARY KEY(`laboratory_id`,`report_id`)
);
--> statement-breakpoint
CREATE TABLE `report_files` (
	`laboratory_id` binary(16) NOT NULL,
	`report_id` binary(16) NOT NULL,
	`pdf` longblob NOT NULL,
	`sha256` binary(32) NOT NULL,
	`size_bytes` int NOT NULL,
	`template_version` varchar(24) character set ascii collate ascii_bin NOT NULL,
	`rendered_at` datetime(3) NOT NULL,
	CONSTRAINT `report_files_laboratory_id_report_id_pk` PRIMARY KEY(`laboratory_id`,`report_id`)
);
--> statement-breakpoint
CREATE TABLE `reports` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`number` varchar(24) character set ascii collate ascii_bin,
	`kind` varchar(30) character set ascii collate ascii_bin NOT NULL,
	`stone_id` binary(16) NOT NULL,
	`client_id` binary(16) NOT NULL,
	`state` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`version` int NOT NULL,
	`code` varchar(16) character set ascii collate ascii_bin,
	`snapshot` json,
	`report_on` date,
	`authorised_by` binary(16),
	`authorised_at` datetime(3),
	`pdf_state` varchar(8) character set ascii collate ascii_bin NOT NULL DEFAULT 'none',
	`pdf_failure` varchar(500) NOT NULL DEFAULT '',
	`pdf_attempts` int NOT NULL DEFAULT 0,
	`pdf_lease_until` datetime(3),
	`issued_at` datetime(3),
	`supersedes_id` binary(16),
	`amendment_reason` varchar(1000) NOT NULL DEFAULT '',
	`withdrawn_at` datetime(3),
	`withdrawn_by` binary(16),
	`withdrawal_reason` varchar(16) character set ascii collate ascii_bin,
	`withdrawal_note` varchar(1000) NOT NULL DEFAULT '',
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `reports_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `reports_number` UNIQUE(`laboratory_id`,`number`),
	CONSTRAINT `reports_code` UNIQUE(`code`),
	CONSTRAINT `reports_stone_version` UNIQUE(`laboratory_id`,`stone_id`,`version`)
);
--> statement-breakpoint
CREATE TABLE `species_tables` (
	`version` varchar(24) character set ascii collate ascii_bin NOT NULL,
	`sha256` binary(32) NOT NULL,
	`row_count` int NOT NULL,
	`rows` json NOT NULL,
	`loaded_at` datetime(3) NOT NULL,
	CONSTRAINT `species_tables_version` PRIMARY KEY(`version`)
);
--> statement-breakpoint
CREATE TABLE `stone_events` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`stone_id` binary(16) NOT NULL,
	`machine` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`from_state` varchar(12) character set ascii collate ascii_bin,
	`to_state` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`why` varchar(500) NOT NULL,
	`at` datetime(3) NOT NULL,
	`by` binary(16),
	CONSTRAINT `stone_events_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `stone_search_tokens` (
	`laboratory_id` binary(16) NOT NULL,
	`token` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`received_at` datetime(3) NOT NULL,
	`stone_id` binary(16) NOT NULL,
	CONSTRAINT `stone_search_tokens_laboratory_id_token_received_at_stone_id_pk` PRIMARY KEY(`laboratory_id`,`token`,`received_at`,`stone_id`)
);
--> statement-breakpoint
CREATE TABLE `stones` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`take_in_id` binary(16) NOT NULL,
	`item_id` binary(16) NOT NULL,
	`client_id` binary(16) NOT NULL,
	`code` varchar(28) character set ascii collate ascii_bin NOT NULL,
	`sequence` smallint NOT NULL,
	`description` varchar(300) NOT NULL,
	`examination_state` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`examination_state_at` datetime(3) NOT NULL,
	`goods_state` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`place` varchar(120) NOT NULL,
	`holder_id` binary(16),
	`examiner_id` binary(16),
	`weight_ct` decimal(10,4),
	`weight_text` varchar(24) NOT NULL DEFAULT '',
	`is_mounted` boolean NOT NULL,
	`is_valuation_ordered` boolean NOT NULL,
	`received_at` datetime(3) NOT NULL,
	`due_on` date NOT NULL,
	`photo_id` binary(16),
	`observation_count` int NOT NULL DEFAULT 0,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `stones_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `stones_code` UNIQUE(`laboratory_id`,`code`)
);
--> statement-breakpoint
CREATE TABLE `custody_events` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`item_id` binary(16) NOT NULL,
	`sequence` int NOT NULL,
	`purpose` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`from_place` varchar(120) NOT NULL,
	`to_place` varchar(120) NOT NULL,
	`holder_id` binary(16),
	`mass_value` decimal(12,4),
	`mass_text` varchar(24) NOT NULL DEFAULT '',
	`mass_unit` varchar(2) character set ascii collate ascii_bin,
	`seal` varchar(60) NOT NULL DEFAULT '',
	`remark` varchar(500) NOT NULL DEFAULT '',
	`at` datetime(3) NOT NULL,
	`by` binary(16) NOT NULL,
	CONSTRAINT `custody_events_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `custody_events_sequence` UNIQUE(`laboratory_id`,`item_id`,`sequence`)
);
--> statement-breakpoint
CREATE TABLE `item_consents` (
	`laboratory_id` binary(16) NOT NULL,
	`item_id` binary(16) NOT NULL,
	`code` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`is_given` boolean NOT NULL,
	`recorded_at` datetime(3) NOT NULL,
	`recorded_by` binary(16) NOT NULL,
	CONSTRAINT `item_consents_laboratory_id_item_id_code_pk` PRIMARY KEY(`laboratory_id`,`item_id`,`code`)
);
--> statement-breakpoint
CREATE TABLE `items` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`take_in_id` binary(16) NOT NULL,
	`position` smallint NOT NULL,
	`number` varchar(24) character set ascii collate ascii_bin NOT NULL,
	`description` varchar(300) NOT NULL,
	`stone_count` smallint NOT NULL,
	`mount` varchar(8) character set ascii collate ascii_bin NOT NULL,
	`mass_value` decimal(12,4) NOT NULL,
	`mass_text` varchar(24) NOT NULL,
	`mass_unit` varchar(2) character set ascii collate ascii_bin NOT NULL,
	`balance_id` binary(16) NOT NULL,
	`condition` varchar(1000) NOT NULL,
	`declared_value_minor` bigint,
	`declared_currency` varchar(3) character set ascii collate ascii_bin,
	CONSTRAINT `items_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `items_number` UNIQUE(`laboratory_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `take_ins` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`number` varchar(24) character set ascii collate ascii_bin NOT NULL,
	`client_id` binary(16) NOT NULL,
	`handed_over_by` varchar(120) NOT NULL,
	`capacity` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`received_at` datetime(3) NOT NULL,
	`received_by` binary(16) NOT NULL,
	`due_on` date NOT NULL,
	`services` json NOT NULL,
	`return_method` varchar(8) character set ascii collate ascii_bin NOT NULL,
	`client_statements` text NOT NULL,
	`fee_agreed_at` datetime(3) NOT NULL,
	`request_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `take_ins_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `take_ins_number` UNIQUE(`laboratory_id`,`number`),
	CONSTRAINT `take_ins_request` UNIQUE(`laboratory_id`,`request_id`)
);
--> statement-breakpoint
CREATE TABLE `valuation_comparables` (
	`laboratory_id` binary(16) NOT NULL,
	`valuation_id` binary(16) NOT NULL,
	`position` int NOT NULL,
	`kind` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`reference` varchar(300) NOT NULL,
	`on_date` date NOT NULL,
	`place` varchar(120) NOT NULL,
	`description` varchar(300) NOT NULL,
	`amount_minor` bigint NOT NULL,
	`currency` varchar(3) character set ascii collate ascii_bin NOT NULL,
	`exchange_rate` decimal(16,8) NOT NULL,
	`is_premium_included` boolean NOT NULL,
	`is_tax_included` boolean NOT NULL,
	`is_sold` boolean NOT NULL,
	`adjustment_factor` decimal(8,4) NOT NULL,
	`adjustment_reason` varchar(300) NOT NULL,
	`adjusted_minor` bigint NOT NULL,
	CONSTRAINT `valuation_comparables_laboratory_id_valuation_id_position_pk` PRIMARY KEY(`laboratory_id`,`valuation_id`,`position`)
);
--> statement-breakpoint
CREATE TABLE `valuations` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`stone_id` binary(16) NOT NULL,
	`conclusion_id` binary(16) NOT NULL,
	`version` int NOT NULL,
	`state` varchar(8) character set ascii collate ascii_bin NOT NULL,
	`purpose` varchar(200) NOT NULL,
	`intended_use` varchar(300) NOT NULL,
	`intended_users` varchar(300) NOT NULL,
	`value_type` varchar(32) character set ascii collate ascii_bin NOT NULL,
	`value_definition` text NOT NULL,
	`value_definition_source` varchar(300) NOT NULL,
	`market_level` varchar(32) character set ascii collate ascii_bin NOT NULL,
	`market_place` varchar(120) NOT NULL,
	`inspection` varchar(300) NOT NULL,
	`inspected_on` date,
	`effective_on` date NOT NULL,
	`currency` varchar(3) character set ascii collate ascii_bin NOT NULL,
	`amount_minor` bigint,
	`is_tax_included` boolean NOT NULL,
	`approach_reasoning` text NOT NULL,
	`other_approaches_why_not` text NOT NULL,
	`limiting_conditions` json NOT NULL,
	`certification` json NOT NULL,
	`prior_services` varchar(500) NOT NULL,
	`written_by` binary(16) NOT NULL,
	`written_at` datetime(3) NOT NULL,
	`signed_by` binary(16),
	`signed_at` datetime(3),
	`row_version` int NOT NULL DEFAULT 1,
	CONSTRAINT `valuations_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `valuations_version` UNIQUE(`laboratory_id`,`stone_id`,`version`)
);
--> statement-breakpoint
ALTER TABLE `email_tokens` ADD CONSTRAINT `email_tokens_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `email_tokens` ADD CONSTRAINT `email_tokens_laboratory_id_laboratories_id_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `email_tokens` ADD CONSTRAINT `email_tokens_created_by_users_id_fk` FOREIGN KEY (`created_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `membership_roles` ADD CONSTRAINT `membership_roles_membership` FOREIGN KEY (`laboratory_id`,`user_id`) REFERENCES `memberships`(`laboratory_id`,`user_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `memberships` ADD CONSTRAINT `memberships_laboratory_id_laboratories_id_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `memberships` ADD CONSTRAINT `memberships_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sessions` ADD CONSTRAINT `sessions_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `attachments` ADD CONSTRAINT `attachments_created_by_users_id_fk` FOREIGN KEY (`created_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `attachments` ADD CONSTRAINT `attachments_item_fk` FOREIGN KEY (`laboratory_id`,`item_id`) REFERENCES `items`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `client_users` ADD CONSTRAINT `client_users_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `client_users` ADD CONSTRAINT `client_users_client` FOREIGN KEY (`laboratory_id`,`client_id`) REFERENCES `clients`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `clients` ADD CONSTRAINT `clients_laboratory_id_laboratories_id_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `clients` ADD CONSTRAINT `clients_terms_granted_by_users_id_fk` FOREIGN KEY (`terms_granted_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `conclusions` ADD CONSTRAINT `conclusions_concluded_by_users_id_fk` FOREIGN KEY (`concluded_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `conclusions` ADD CONSTRAINT `conclusions_stone_fk` FOREIGN KEY (`laboratory_id`,`stone_id`) REFERENCES `stones`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `second_checks` ADD CONSTRAINT `second_checks_checker_id_users_id_fk` FOREIGN KEY (`checker_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `second_checks` ADD CONSTRAINT `second_checks_stone_fk` FOREIGN KEY (`laboratory_id`,`stone_id`) REFERENCES `stones`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `second_checks` ADD CONSTRAINT `second_checks_conclusion_fk` FOREIGN KEY (`laboratory_id`,`conclusion_id`) REFERENCES `conclusions`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `instrument_checks` ADD CONSTRAINT `instrument_checks_checked_by_users_id_fk` FOREIGN KEY (`checked_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `instrument_checks` ADD CONSTRAINT `instrument_checks_fk` FOREIGN KEY (`laboratory_id`,`instrument_id`) REFERENCES `instruments`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `instruments` ADD CONSTRAINT `instruments_laboratory_id_laboratories_id_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invoice_lines` ADD CONSTRAINT `invoice_lines_fk` FOREIGN KEY (`laboratory_id`,`invoice_id`) REFERENCES `invoices`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invoices` ADD CONSTRAINT `invoices_created_by_users_id_fk` FOREIGN KEY (`created_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invoices` ADD CONSTRAINT `invoices_take_in_fk` FOREIGN KEY (`laboratory_id`,`take_in_id`) REFERENCES `take_ins`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invoices` ADD CONSTRAINT `invoices_client_fk` FOREIGN KEY (`laboratory_id`,`client_id`) REFERENCES `clients`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `payments` ADD CONSTRAINT `payments_recorded_by_users_id_fk` FOREIGN KEY (`recorded_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `payments` ADD CONSTRAINT `payments_invoice_fk` FOREIGN KEY (`laboratory_id`,`invoice_id`) REFERENCES `invoices`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `prices` ADD CONSTRAINT `prices_laboratory_id_laboratories_id_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `prices` ADD CONSTRAINT `prices_changed_by_users_id_fk` FOREIGN KEY (`changed_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `provider_events` ADD CONSTRAINT `provider_events_laboratory_id_laboratories_id_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `series_counters` ADD CONSTRAINT `series_counters_laboratory_id_laboratories_id_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `observation_strikes` ADD CONSTRAINT `observation_strikes_struck_by_users_id_fk` FOREIGN KEY (`struck_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `observation_strikes` ADD CONSTRAINT `observation_strikes_fk` FOREIGN KEY (`laboratory_id`,`observation_id`) REFERENCES `observations`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `observation_values` ADD CONSTRAINT `observation_values_fk` FOREIGN KEY (`laboratory_id`,`observation_id`) REFERENCES `observations`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `observations` ADD CONSTRAINT `observations_observer_id_users_id_fk` FOREIGN KEY (`observer_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `observations` ADD CONSTRAINT `observations_stone_fk` FOREIGN KEY (`laboratory_id`,`stone_id`) REFERENCES `stones`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `observations` ADD CONSTRAINT `observations_instrument_fk` FOREIGN KEY (`laboratory_id`,`instrument_id`) REFERENCES `instruments`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `audit_events` ADD CONSTRAINT `audit_events_laboratory_id_laboratories_id_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `audit_events` ADD CONSTRAINT `audit_events_actor_id_users_id_fk` FOREIGN KEY (`actor_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `outgoing_mail` ADD CONSTRAINT `outgoing_mail_laboratory_id_laboratories_id_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `register_entries` ADD CONSTRAINT `register_entries_fk` FOREIGN KEY (`laboratory_id`,`report_id`) REFERENCES `reports`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `register_photos` ADD CONSTRAINT `register_photos_fk` FOREIGN KEY (`laboratory_id`,`report_id`) REFERENCES `reports`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `report_files` ADD CONSTRAINT `report_files_fk` FOREIGN KEY (`laboratory_id`,`report_id`) REFERENCES `reports`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reports` ADD CONSTRAINT `reports_authorised_by_users_id_fk` FOREIGN KEY (`authorised_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reports` ADD CONSTRAINT `reports_withdrawn_by_users_id_fk` FOREIGN KEY (`withdrawn_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reports` ADD CONSTRAINT `reports_stone_fk` FOREIGN KEY (`laboratory_id`,`stone_id`) REFERENCES `stones`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reports` ADD CONSTRAINT `reports_client_fk` FOREIGN KEY (`laboratory_id`,`client_id`) REFERENCES `clients`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `stone_events` ADD CONSTRAINT `stone_events_by_users_id_fk` FOREIGN KEY (`by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `stone_events` ADD CONSTRAINT `stone_events_stone_fk` FOREIGN KEY (`laboratory_id`,`stone_id`) REFERENCES `stones`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `stone_search_tokens` ADD CONSTRAINT `stone_search_tokens_fk` FOREIGN KEY (`laboratory_id`,`stone_id`) REFERENCES `stones`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `stones` ADD CONSTRAINT `stones_holder_id_users_id_fk` FOREIGN KEY (`holder_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `stones` ADD CONSTRAINT `stones_examiner_id_users_id_fk` FOREIGN KEY (`examiner_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `stones` ADD CONSTRAINT `stones_item_fk` FOREIGN KEY (`laboratory_id`,`item_id`) REFERENCES `items`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `stones` ADD CONSTRAINT `stones_take_in_fk` FOREIGN KEY (`laboratory_id`,`take_in_id`) REFERENCES `take_ins`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `stones` ADD CONSTRAINT `stones_client_fk` FOREIGN KEY (`laboratory_id`,`client_id`) REFERENCES `clients`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `custody_events` ADD CONSTRAINT `custody_events_holder_id_users_id_fk` FOREIGN KEY (`holder_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `custody_events` ADD CONSTRAINT `custody_events_by_users_id_fk` FOREIGN KEY (`by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `custody_events` ADD CONSTRAINT `custody_events_item_fk` FOREIGN KEY (`laboratory_id`,`item_id`) REFERENCES `items`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `item_consents` ADD CONSTRAINT `item_consents_recorded_by_users_id_fk` FOREIGN KEY (`recorded_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `item_consents` ADD CONSTRAINT `item_consents_item_fk` FOREIGN KEY (`laboratory_id`,`item_id`) REFERENCES `items`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `items` ADD CONSTRAINT `items_take_in_fk` FOREIGN KEY (`laboratory_id`,`take_in_id`) REFERENCES `take_ins`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `items` ADD CONSTRAINT `items_balance_fk` FOREIGN KEY (`laboratory_id`,`balance_id`) REFERENCES `instruments`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `take_ins` ADD CONSTRAINT `take_ins_laboratory_id_laboratories_id_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `take_ins` ADD CONSTRAINT `take_ins_received_by_users_id_fk` FOREIGN KEY (`received_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `take_ins` ADD CONSTRAINT `take_ins_client_fk` FOREIGN KEY (`laboratory_id`,`client_id`) REFERENCES `clients`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `valuation_comparables` ADD CONSTRAINT `valuation_comparables_fk` FOREIGN KEY (`laboratory_id`,`valuation_id`) REFERENCES `valuations`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `valuations` ADD CONSTRAINT `valuations_written_by_users_id_fk` FOREIGN KEY (`written_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `valuations` ADD CONSTRAINT `valuations_signed_by_users_id_fk` FOREIGN KEY (`signed_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `valuations` ADD CONSTRAINT `valuations_stone_fk` FOREIGN KEY (`laboratory_id`,`stone_id`) REFERENCES `stones`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `valuations` ADD CONSTRAINT `valuations_conclusion_fk` FOREIGN KEY (`laboratory_id`,`conclusion_id`) REFERENCES `conclusions`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `email_tokens_laboratory` ON `email_tokens` (`laboratory_id`,`purpose`);--> statement-breakpoint
CREATE INDEX `email_tokens_user` ON `email_tokens` (`user_id`);--> statement-breakpoint
CREATE INDEX `memberships_user` ON `memberships` (`user_id`);--> statement-breakpoint
CREATE INDEX `rate_limits_expire` ON `rate_limits` (`expire`);--> statement-breakpoint
CREATE INDEX `sessions_user` ON `sessions` (`user_id`);--> statement-breakpoint
CREATE INDEX `sessions_expires` ON `sessions` (`expires_at`);--> statement-breakpoint
CREATE INDEX `attachments_item` ON `attachments` (`laboratory_id`,`item_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `attachments_stone` ON `attachments` (`laboratory_id`,`stone_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `client_users_user` ON `client_users` (`user_id`);--> statement-breakpoint
CREATE INDEX `clients_name` ON `clients` (`laboratory_id`,`name`,`id`);--> statement-breakpoint
CREATE INDEX `second_checks_stone` ON `second_checks` (`laboratory_id`,`stone_id`,`started_at`);--> statement-breakpoint
CREATE INDEX `instrument_checks_instrument` ON `instrument_checks` (`laboratory_id`,`instrument_id`,`checked_at`);--> statement-breakpoint
CREATE INDEX `invoices_take_in` ON `invoices` (`laboratory_id`,`take_in_id`);--> statement-breakpoint
CREATE INDEX `invoices_state` ON `invoices` (`laboratory_id`,`state`,`created_at`,`id`);--> statement-breakpoint
CREATE INDEX `invoices_created` ON `invoices` (`laboratory_id`,`created_at`,`id`);--> statement-breakpoint
CREATE INDEX `invoices_client` ON `invoices` (`laboratory_id`,`client_id`,`created_at`,`id`);--> statement-breakpoint
CREATE INDEX `payments_invoice` ON `payments` (`laboratory_id`,`invoice_id`);--> statement-breakpoint
CREATE INDEX `observations_instrument` ON `observations` (`laboratory_id`,`instrument_id`,`observed_at`);--> statement-breakpoint
CREATE INDEX `audit_events_subject` ON `audit_events` (`laboratory_id`,`subject_kind`,`subject_id`,`at`);--> statement-breakpoint
CREATE INDEX `audit_events_at` ON `audit_events` (`laboratory_id`,`at`,`id`);--> statement-breakpoint
CREATE INDEX `outgoing_mail_queue` ON `outgoing_mail` (`state`,`next_attempt_at`);--> statement-breakpoint
CREATE INDEX `outgoing_mail_laboratory` ON `outgoing_mail` (`laboratory_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `report_files_sha256` ON `report_files` (`sha256`);--> statement-breakpoint
CREATE INDEX `reports_created` ON `reports` (`laboratory_id`,`created_at`,`id`);--> statement-breakpoint
CREATE INDEX `reports_state` ON `reports` (`laboratory_id`,`state`,`created_at`,`id`);--> statement-breakpoint
CREATE INDEX `reports_client` ON `reports` (`laboratory_id`,`client_id`,`created_at`,`id`);--> statement-breakpoint
CREATE INDEX `reports_pdf_queue` ON `reports` (`pdf_state`,`pdf_lease_until`);--> statement-breakpoint
CREATE INDEX `stone_events_stone` ON `stone_events` (`laboratory_id`,`stone_id`,`at`);--> statement-breakpoint
CREATE INDEX `stone_search_tokens_stone` ON `stone_search_tokens` (`laboratory_id`,`stone_id`);--> statement-breakpoint
CREATE INDEX `stones_received` ON `stones` (`laboratory_id`,`received_at`,`id`);--> statement-breakpoint
CREATE INDEX `stones_due` ON `stones` (`laboratory_id`,`due_on`,`id`);--> statement-breakpoint
CREATE INDEX `stones_state_received` ON `stones` (`laboratory_id`,`examination_state`,`received_at`,`id`);--> statement-breakpoint
CREATE INDEX `stones_state_due` ON `stones` (`laboratory_id`,`examination_state`,`due_on`,`id`);--> statement-breakpoint
CREATE INDEX `stones_goods_received` ON `stones` (`laboratory_id`,`goods_state`,`received_at`,`id`);--> statement-breakpoint
CREATE INDEX `stones_client_received` ON `stones` (`laboratory_id`,`client_id`,`received_at`,`id`);--> statement-breakpoint
CREATE INDEX `stones_holder_received` ON `stones` (`laboratory_id`,`holder_id`,`received_at`,`id`);--> statement-breakpoint
CREATE INDEX `stones_item` ON `stones` (`laboratory_id`,`item_id`,`sequence`);--> statement-breakpoint
CREATE INDEX `items_take_in` ON `items` (`laboratory_id`,`take_in_id`,`position`);--> statement-breakpoint
CREATE INDEX `take_ins_client` ON `take_ins` (`laboratory_id`,`client_id`,`received_at`);