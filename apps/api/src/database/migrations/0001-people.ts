import { inOrder } from './statements.js';

/** People, their sessions and one-time tokens, the staff log, shared rate limits. */
export const up = inOrder(
  `CREATE TABLE people (
    id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    email VARCHAR(254) NOT NULL,
    name VARCHAR(80) NOT NULL,
    passphrase_hash VARCHAR(255) NULL,
    role ENUM('buyer','helper','bookkeeper','maker','owner') NOT NULL DEFAULT 'buyer',
    verified_at DATETIME(6) NULL,
    created_at DATETIME(6) NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    UNIQUE KEY people_email (email),
    KEY people_role (role, created_at)
  )`,
  `CREATE TABLE sessions (
    sid VARCHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    expires DATETIME(6) NULL,
    data MEDIUMTEXT NULL,
    person_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
    created_at DATETIME(6) NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    KEY sessions_person (person_id),
    KEY sessions_expires (expires)
  )`,
  `CREATE TABLE one_time_tokens (
    id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
    person_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    purpose ENUM('verify','sign-in','reset','invite') NOT NULL,
    token_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    expires_at DATETIME(6) NOT NULL,
    used_at DATETIME(6) NULL,
    created_at DATETIME(6) NOT NULL,
    UNIQUE KEY one_time_tokens_hash (token_hash),
    KEY one_time_tokens_person (person_id, purpose),
    CONSTRAINT one_time_tokens_person_fk FOREIGN KEY (person_id) REFERENCES people (id) ON DELETE CASCADE
  )`,
  `CREATE TABLE staff_log (
    id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
    at DATETIME(6) NOT NULL,
    person_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
    who VARCHAR(120) NOT NULL,
    what VARCHAR(120) NOT NULL,
    subject VARCHAR(200) NOT NULL,
    before_json JSON NULL,
    after_json JSON NULL,
    KEY staff_log_at (at)
  )`,
  `CREATE TABLE rate_limits (
    \`key\` VARCHAR(255) CHARACTER SET utf8 NOT NULL PRIMARY KEY,
    points INT NOT NULL DEFAULT 0,
    expire BIGINT UNSIGNED NULL
  )`,
);
