import { inOrder } from './statements.js';

const ID = 'CHAR(36) CHARACTER SET ascii COLLATE ascii_bin';
const SHA = 'CHAR(64) CHARACTER SET ascii COLLATE ascii_bin';

/** The maker's posts and their pictures. */
export const up = inOrder(
  `CREATE TABLE posts (
    id ${ID} NOT NULL PRIMARY KEY,
    slug VARCHAR(60) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    title VARCHAR(120) NOT NULL,
    lead VARCHAR(300) NOT NULL,
    body MEDIUMTEXT NOT NULL,
    audience ENUM('everybody','supporters') NOT NULL DEFAULT 'everybody',
    state ENUM('draft','published') NOT NULL DEFAULT 'draft',
    kit_id ${ID} NULL,
    published_at DATETIME(6) NULL,
    created_at DATETIME(6) NOT NULL,
    updated_at DATETIME(6) NOT NULL,
    UNIQUE KEY posts_slug (slug),
    KEY posts_published (state, published_at),
    CONSTRAINT posts_kit_fk FOREIGN KEY (kit_id) REFERENCES kits (id)
  )`,
  `CREATE TABLE post_pictures (
    id ${ID} NOT NULL PRIMARY KEY,
    post_id ${ID} NOT NULL,
    sha256 ${SHA} NOT NULL,
    content_type VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    file_name VARCHAR(200) NOT NULL,
    bytes INT UNSIGNED NOT NULL,
    created_at DATETIME(6) NOT NULL,
    KEY post_pictures_post (post_id, created_at),
    CONSTRAINT post_pictures_post_fk FOREIGN KEY (post_id) REFERENCES posts (id) ON DELETE CASCADE
  )`,
);
