package fringekeep.bundle.stated;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.Optional;
import org.junit.jupiter.api.Test;

/** The sample identifier and a check character X as printed in ORCID's "Structure of the ORCID Identifier" (ISO 7064). */
class AuthorReferenceTest {
    @Test
    void acceptsThePublishedExamples() {
        assertThat(Author.isOrcid("0000-0002-1825-0097")).isTrue();
        assertThat(Author.isOrcid("0000-0002-1694-233X")).isTrue();
    }

    @Test
    void findsEverySingleChangedDigit() {
        String good = "0000-0002-1825-0097";
        for (int i = 0; i < good.length(); i++) {
            for (char digit = '0'; digit <= '9'; digit++) {
                String other = good.substring(0, i) + digit + good.substring(i + 1);
                if (!other.equals(good)) {
                    assertThat(Author.isOrcid(other)).as(other).isFalse();
                }
            }
        }
    }

    @Test
    void anAuthorWithAWrongOneIsRefused() {
        assertThatThrownBy(() -> new Author("A. Name", Optional.of("0000-0002-1825-0098"), Optional.empty()))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("0000-0002-1825-0098");
    }
}
