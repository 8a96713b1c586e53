-- Record format 1, section 12. Above the line insert-only (but for purge), read with READ UNCOMMITTED and n <= watermark.
create table node (
    id bigint primary key,
    sha char(32) for bit data not null unique,
    sort char(1) not null check (sort in ('r', 'w')));
create table record (
    n bigint primary key,
    node bigint not null unique references node,
    kind varchar(40) not null,
    schema_number int not null,
    thing char(16) for bit data not null,
    head blob(4m) not null);
create index record_thing on record (thing, n);
create index record_kind on record (kind, n desc);
create table part (
    sha char(32) for bit data primary key,
    n bigint not null,
    bytes blob(8m) not null);
create table record_part (
    n bigint not null references record,
    name varchar(20) not null,
    sha char(32) for bit data not null,
    primary key (n, name));
create index record_part_sha on record_part (sha);
create table record_payload (
    n bigint not null references record,
    name varchar(64) not null,
    sha char(32) for bit data not null,
    size bigint not null,
    form varchar(20) not null,
    primary key (n, name));
create index record_payload_sha on record_payload (sha);
create table edge (
    src bigint not null,
    link char(1) not null check (link in ('i', 'a', 'c', 'f')),
    seq int not null,
    role varchar(40) not null,
    dst bigint not null,
    channel varchar(64),
    reach char(1),
    n bigint not null,
    primary key (src, link, seq));
create index edge_back on edge (dst, link, src);
create table raw_file (
    sha char(32) for bit data primary key,
    n bigint not null,
    size bigint not null);
create table payload (
    sha char(32) for bit data primary key,
    n bigint not null,
    size bigint not null,
    bytes blob(64k));
create table journal (
    n bigint primary key,
    sha char(32) for bit data not null unique,
    act varchar(20) not null,
    bytes blob(64k) not null);
create index journal_act on journal (act, n);
create table thing_number (
    archive char(16) for bit data not null,
    kind varchar(40) not null,
    number bigint not null,
    thing char(16) for bit data not null unique,
    n bigint not null,
    primary key (archive, kind, number));
create table word (
    word varchar(64) not null,
    n bigint not null,
    primary key (word, n));
create index word_record on word (n);
-- ------------------------------------------------------------------ line: what may change
create table projection (
    name varchar(60) primary key,
    kind varchar(40) not null,
    declaration char(32) for bit data not null,
    filled_to bigint not null);
create table draft (
    id char(16) for bit data primary key,
    kind varchar(40) not null,
    person char(16) for bit data,
    body clob(16m) not null,
    saved timestamp not null);
create table person (
    id char(16) for bit data primary key,
    name varchar(200),
    orcid varchar(19),
    mail varchar(200));
create table migration (
    number int primary key,
    sha char(32) for bit data not null,
    applied timestamp not null);
