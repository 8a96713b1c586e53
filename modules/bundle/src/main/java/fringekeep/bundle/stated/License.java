package fringekeep.bundle.stated;

import java.util.Optional;

/** Licences offered for data, by their SPDX identifier (https://spdx.org/licenses/). */
public enum License {
    /** Attribution. */
    CC_BY_4_0(
            "CC-BY-4.0",
            "Creative Commons Attribution 4.0 International",
            "https://creativecommons.org/licenses/by/4.0/"),
    /** No rights kept. */
    CC0_1_0("CC0-1.0", "Creative Commons Zero 1.0 Universal", "https://creativecommons.org/publicdomain/zero/1.0/"),
    /** Attribution, for databases. */
    ODC_BY_1_0(
            "ODC-By-1.0", "Open Data Commons Attribution License 1.0", "https://opendatacommons.org/licenses/by/1-0/"),
    /** Attribution and share-alike, for databases. */
    ODBL_1_0(
            "ODbL-1.0",
            "Open Data Commons Open Database License 1.0",
            "https://opendatacommons.org/licenses/odbl/1-0/");

    private final String identifier;
    private final String title;
    private final String address;

    License(String identifier, String title, String address) {
        this.identifier = identifier;
        this.title = title;
        this.address = address;
    }

    /** SPDX identifier, exact case. */
    public String identifier() {
        return identifier;
    }

    /** Full name. */
    public String title() {
        return title;
    }

    /** Where its text stands. */
    public String address() {
        return address;
    }

    /** The licence of an SPDX identifier, exact case. */
    public static Optional<License> of(String identifier) {
        for (License license : values()) {
            if (license.identifier.equals(identifier)) {
                return Optional.of(license);
            }
        }
        return Optional.empty();
    }
}
