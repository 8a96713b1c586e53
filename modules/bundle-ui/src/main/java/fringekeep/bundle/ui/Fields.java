package fringekeep.bundle.ui;

import fringekeep.bundle.stated.License;
import fringekeep.bundle.ui.BundleDraft.Writer;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Mark;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.OfferedWords;
import fringekeep.desk.part.WordButton;
import fringekeep.desk.part.WordLines;
import java.awt.BorderLayout;
import java.awt.Dimension;
import java.awt.GridBagConstraints;
import java.awt.GridBagLayout;
import java.awt.GridLayout;
import java.awt.Insets;
import java.awt.KeyboardFocusManager;
import java.awt.Rectangle;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Supplier;
import javax.swing.BorderFactory;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JTextArea;
import javax.swing.JTextField;
import javax.swing.Scrollable;
import javax.swing.event.DocumentEvent;
import javax.swing.event.DocumentListener;
import javax.swing.text.JTextComponent;

/** The fields of what is said about a dataset, each with its fault behind it. */
@SuppressWarnings("serial")
final class Fields extends JPanel implements Scrollable {
    private static final Texts TEXTS = new Texts("fringekeep.bundle.ui.Texts", Fields.class);
    private static final List<License> LICENSES = List.of(License.values());

    private final transient Runnable changed;
    private final JTextField title = field("title", "export.title.field");
    private final JTextField name = field("name", "export.name");
    private final JTextArea description = new JTextArea(3, 20);
    private final JTextField published = field("published", "export.published");
    private final JTextField publisher = field("publisher", "export.publisher");
    private final JTextField keywords = field("keywords", "export.keywords");
    private final JTextField into = field("into", "export.into");
    private final OfferedWords license;
    private final OfferedWords form;
    private final WordButton more = WordButton.low(TEXTS.of("export.more"), 'A', false);
    private final WordButton choose = WordButton.low(TEXTS.of("export.choose"), 'C', false);
    private final transient List<List<JTextField>> authors = new ArrayList<>();
    private final transient Map<String, WordLines> faults = new HashMap<>();
    private final transient List<JLabel> labels = new ArrayList<>();
    private boolean filling;

    Fields(Runnable changed, Supplier<Optional<String>> folder) {
        super(new GridBagLayout());
        this.changed = changed;
        setOpaque(false);
        setName("fields");
        description.setName("description");
        description.setFont(Type.BODY);
        description.setLineWrap(true);
        description.setWrapStyleWord(true);
        description.getAccessibleContext().setAccessibleName(TEXTS.of("export.description"));
        description.setFocusTraversalKeys(KeyboardFocusManager.FORWARD_TRAVERSAL_KEYS, null);
        description.setFocusTraversalKeys(KeyboardFocusManager.BACKWARD_TRAVERSAL_KEYS, null);
        license = new OfferedWords(
                "license",
                TEXTS.of("export.license"),
                LICENSES.stream().map(License::identifier).toList(),
                0,
                chosen -> told());
        form = new OfferedWords(
                "form",
                TEXTS.of("export.form"),
                List.of(TEXTS.of("export.folder"), TEXTS.of("export.zip")),
                0,
                chosen -> told());
        List.of(title, name, description, published, publisher, keywords, into).forEach(this::listen);
        more.setName("another author");
        more.addActionListener(event -> {
            author(new Writer("", "", ""));
            build();
            told();
            authors.get(authors.size() - 1).get(0).requestFocusInWindow();
        });
        choose.setName("choose folder");
        choose.addActionListener(event -> folder.get().ifPresent(into::setText));
        author(new Writer("", "", ""));
        build();
    }

    private static JTextField field(String name, String key) {
        JTextField field = new JTextField();
        field.setName(name);
        field.setFont(Type.BODY);
        field.getAccessibleContext().setAccessibleName(TEXTS.of(key));
        return field;
    }

    private void listen(JTextComponent field) {
        field.getDocument().addDocumentListener(new DocumentListener() {
            @Override
            public void insertUpdate(DocumentEvent event) {
                told();
            }

            @Override
            public void removeUpdate(DocumentEvent event) {
                told();
            }

            @Override
            public void changedUpdate(DocumentEvent event) {
                told();
            }
        });
    }

    private void told() {
        if (!filling) {
            changed.run();
        }
    }

    private void author(Writer writer) {
        List<JTextField> row = new ArrayList<>();
        int number = authors.size();
        for (String part : List.of("name", "orcid", "affiliation")) {
            JTextField field = field("author " + number + " " + part, "export.author." + part);
            field.putClientProperty("JTextField.placeholderText", TEXTS.of("export.author." + part));
            row.add(field);
        }
        row.get(0).setText(writer.name());
        row.get(1).setText(writer.orcid());
        row.get(2).setText(writer.affiliation());
        row.forEach(this::listen);
        authors.add(row);
    }

    private void build() {
        removeAll();
        faults.clear();
        labels.clear();
        int y = 0;
        row(y++, "export.title.field", "title", title);
        row(y++, "export.name", "name", name);
        row(y++, "export.description", "description", description);
        for (int i = 0; i < authors.size(); i++) {
            JPanel three = new JPanel(new GridLayout(1, 3, 6, 0));
            three.setOpaque(false);
            authors.get(i).forEach(three::add);
            wide(y++, TEXTS.of("export.author", i + 1), three);
            WordLines fault = fault("author." + i);
            add(fault, at(1, y++, 2, 0));
        }
        JPanel one = new JPanel(new BorderLayout());
        one.setOpaque(false);
        one.add(more, BorderLayout.WEST);
        add(one, at(1, y++, 2, 2));
        row(y++, "export.publisher", "publisher", publisher);
        row(y++, "export.published", "published", published);
        row(y++, "export.keywords", "keywords", keywords);
        wide(y++, TEXTS.of("export.license"), license);
        JPanel place = new JPanel(new BorderLayout(6, 0));
        place.setOpaque(false);
        place.add(into, BorderLayout.CENTER);
        place.add(choose, BorderLayout.EAST);
        row(y++, "export.into", "into", place);
        wide(y++, TEXTS.of("export.form"), form);
        GridBagConstraints rest = at(0, y, 3, 0);
        rest.weighty = 1;
        add(new JLabel(), rest);
        revalidate();
    }

    private WordLines fault(String field) {
        WordLines lines = new WordLines("fault " + field);
        faults.put(field, lines);
        return lines;
    }

    private void row(int y, String key, String field, JComponent component) {
        label(y, TEXTS.of(key), component);
        GridBagConstraints middle = at(1, y, 1, 4);
        middle.weightx = 1;
        add(sized(component), middle);
        GridBagConstraints right = at(2, y, 1, 8);
        right.insets = new Insets(8, 10, 0, 0);
        right.weightx = 0;
        add(narrow(fault(field)), right);
    }

    private void wide(int y, String words, JComponent component) {
        label(y, words, component);
        add(sized(component), at(1, y, 2, 4));
    }

    private void label(int y, String words, JComponent component) {
        JLabel label = new JLabel(words);
        label.setFont(Type.BODY);
        label.setForeground(Ink.INK2.color());
        label.setLabelFor(component);
        labels.add(label);
        GridBagConstraints left = at(0, y, 1, 8);
        left.weightx = 0;
        left.fill = GridBagConstraints.NONE;
        left.insets = new Insets(8, 0, 0, 16);
        add(label, left);
    }

    private static JComponent sized(JComponent component) {
        if (!(component instanceof JTextArea) && !(component instanceof OfferedWords)) {
            component.setPreferredSize(new Dimension(120, 26));
        }
        if (component instanceof JTextArea area) {
            area.setBorder(BorderFactory.createCompoundBorder(
                    BorderFactory.createLineBorder(Ink.RULE.color()), BorderFactory.createEmptyBorder(2, 5, 2, 5)));
        }
        return component;
    }

    private static JComponent narrow(WordLines lines) {
        JPanel room = new JPanel(new BorderLayout());
        room.setOpaque(false);
        room.setPreferredSize(new Dimension(190, 22));
        room.add(lines, BorderLayout.CENTER);
        return room;
    }

    private static GridBagConstraints at(int x, int y, int width, int above) {
        return new GridBagConstraints(
                x,
                y,
                width,
                1,
                1,
                0,
                GridBagConstraints.NORTHWEST,
                GridBagConstraints.HORIZONTAL,
                new Insets(above, 0, 0, 0),
                0,
                0);
    }

    /** Shows a draft in the fields. */
    void fill(BundleDraft draft) {
        filling = true;
        title.setText(draft.title());
        name.setText(draft.name());
        description.setText(draft.description());
        published.setText(draft.published());
        publisher.setText(draft.publisher());
        keywords.setText(draft.keywords());
        into.setText(draft.into());
        license.offer(license.words(), Math.max(0, license.words().indexOf(draft.license())));
        form.offer(form.words(), draft.zip() ? 1 : 0);
        authors.clear();
        draft.authors().forEach(this::author);
        if (authors.isEmpty()) {
            author(new Writer("", "", ""));
        }
        build();
        filling = false;
    }

    /** What is typed. */
    BundleDraft draft() {
        return new BundleDraft(
                name.getText(),
                title.getText(),
                description.getText(),
                published.getText(),
                license.chosen() < 0 ? "" : LICENSES.get(license.chosen()).identifier(),
                publisher.getText(),
                keywords.getText(),
                authors.stream()
                        .map(row -> new Writer(
                                row.get(0).getText(),
                                row.get(1).getText(),
                                row.get(2).getText()))
                        .toList(),
                into.getText(),
                form.chosen() == 1);
    }

    /** Says what is wrong at each field. */
    void faults(Map<String, String> wrong) {
        faults.forEach((field, lines) -> {
            String own = wrong.getOrDefault(field, wrong.getOrDefault(field + ".orcid", ""));
            lines.show(own.isEmpty() ? List.of() : List.of(WordLines.Sentence.marked(Mark.QUESTION, own)));
        });
    }

    /** While something is written, nothing is typed. */
    void running(boolean runs) {
        List<JComponent> all = new ArrayList<>(
                List.of(title, name, description, published, publisher, keywords, into, license, form, more, choose));
        authors.forEach(all::addAll);
        all.forEach(one -> one.setEnabled(!runs));
    }

    void focusFirst() {
        Arrays.asList(title, name, description).stream()
                .filter(one -> one.getText().isBlank())
                .findFirst()
                .orElse(title)
                .requestFocusInWindow();
    }

    /** What is said at a field, for tests. */
    String faultAt(String field) {
        WordLines lines = faults.get(field);
        return lines == null || lines.words() == null ? "" : lines.words();
    }

    @Override
    public Dimension getPreferredScrollableViewportSize() {
        return getPreferredSize();
    }

    @Override
    public int getScrollableUnitIncrement(Rectangle visible, int orientation, int direction) {
        return 30;
    }

    @Override
    public int getScrollableBlockIncrement(Rectangle visible, int orientation, int direction) {
        return Math.max(30, visible.height - 30);
    }

    @Override
    public boolean getScrollableTracksViewportWidth() {
        return true;
    }

    @Override
    public boolean getScrollableTracksViewportHeight() {
        return getParent() != null && getParent().getHeight() > getPreferredSize().height;
    }

    @Override
    public void updateUI() {
        super.updateUI();
        if (labels != null) {
            labels.forEach(label -> label.setForeground(Ink.INK2.color()));
            description.setBackground(Ink.SHEET.color());
            description.setForeground(Ink.INK.color());
        }
    }
}
