-- What may change as well: how many records each kind has, how many of them were replaced, and the last number given
-- here, so that nobody counts rows;
-- and what other archives, whose things were received with their numbers, call themselves.
create table tally (
    kind varchar(40) primary key,
    records bigint not null,
    replaced bigint not null,
    numbered bigint not null);
create table origin (
    archive char(16) for bit data primary key,
    title varchar(1000) not null);
