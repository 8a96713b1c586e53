package fringekeep.desk.form;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** What a schema asks for at one place of a record: a single value, a group of named ones, or rows of one sort. */
sealed interface Asked {
    /** The schema's words about it; may be empty. */
    String description();

    /**
     * A single value, typed into one field.
     *
     * @param sort how it is typed
     * @param siUnit UCUM code of the SI unit a quantity must reduce to; empty = any, or no quantity
     * @param usualFrom lower end of what is usual (SI)
     * @param usualTo upper end of what is usual (SI)
     * @param options codes to choose among; empty = free
     * @param longest characters at most
     */
    record Leaf(
            Sort sort,
            String description,
            Optional<String> siUnit,
            OptionalDouble usualFrom,
            OptionalDouble usualTo,
            List<String> options,
            int longest)
            implements Asked {
        /** Copies. */
        public Leaf {
            options = List.copyOf(options);
        }

        static Leaf of(Sort sort, String description) {
            return new Leaf(
                    sort, description, Optional.empty(), OptionalDouble.empty(), OptionalDouble.empty(), List.of(), 0);
        }

        Leaf among(List<String> codes) {
            return new Leaf(sort, description, siUnit, usualFrom, usualTo, codes, longest);
        }
    }

    /**
     * Named values that belong together.
     *
     * @param narrowings choices of one member that narrow those of another
     */
    record Group(String description, List<Member> members, List<Narrowing> narrowings) implements Asked {
        /** Copies. */
        public Group {
            members = List.copyOf(members);
            narrowings = List.copyOf(narrowings);
        }

        Optional<Member> member(String name) {
            return members.stream().filter(member -> member.name().equals(name)).findFirst();
        }
    }

    /** As many values of one sort as are needed, in an order that means something. */
    record Rows(String description, Asked item, int most) implements Asked {}

    /** A member of a group. */
    record Member(String name, Asked asked, boolean required) {}

    /** Where {@code by} is {@code code}, {@code member} is one of {@code options}. */
    record Narrowing(String by, String code, String member, List<String> options) {
        /** Copies. */
        public Narrowing {
            options = List.copyOf(options);
        }
    }

    /** How a single value is typed. */
    enum Sort {
        /** A line of text. */
        TEXT,
        /** Text of several lines. */
        WORDS,
        /** One of some codes. */
        CHOICE,
        /** Several of some codes. */
        CHOICES,
        /** Value, uncertainty and unit. */
        QUANTITY,
        /** A number without unit. */
        NUMBER,
        /** A whole number. */
        INTEGER,
        /** Yes or no. */
        FLAG,
        /** A true constant: yes or nothing. */
        MARKED,
        /** Date and time with offset. */
        MOMENT,
        /** Date and time, kept in UTC. */
        INSTANT,
        /** Numbers in one line. */
        NUMBERS,
        /** Ranges of whole numbers in one line: {@code 3-7 12}. */
        RANGES,
        /** Another record, by what people call it. */
        RECORD,
        /** A raw file, by its path. */
        FILE
    }
}
