package fringekeep.archive.record;

/** The form of ids: 32 lower-case hexadecimal digits. */
final class IdForm {
    private IdForm() {}

    static void require(String hex) {
        if (hex.length() != 32 || !hex.chars().allMatch(c -> (c >= '0' && c <= '9') || (c >= 'a' && c <= 'f'))) {
            throw new IllegalArgumentException("not 32 lower-case hexadecimal digits: " + hex);
        }
    }
}
