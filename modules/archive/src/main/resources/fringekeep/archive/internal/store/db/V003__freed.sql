-- What may change as well: tables from which something was purged and whose free pages may still hold it. A row goes when
-- the table has been written anew, so what a crash cuts short is done at the next opening.
create table freed (
    name varchar(128) primary key);
