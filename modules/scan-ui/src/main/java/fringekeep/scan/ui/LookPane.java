package fringekeep.scan.ui;

import fringekeep.archive.problem.Problem;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Texts;
import fringekeep.desk.look.Type;
import fringekeep.desk.part.OfferedWords;
import fringekeep.desk.part.WordLines;
import fringekeep.drawing.Picture;
import fringekeep.drawing.PictureView;
import fringekeep.scan.FilePlace;
import fringekeep.scan.TryFiles.Look;
import java.awt.BorderLayout;
import java.awt.GridLayout;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import java.util.stream.IntStream;
import javax.swing.BorderFactory;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JScrollPane;

/** A file's raw text beside its counts. */
@SuppressWarnings("serial")
final class LookPane extends JPanel {
    private static final Texts TEXTS = new Texts("fringekeep.scan.ui.Texts", LookPane.class);

    private final RawText raw = new RawText();
    private final JScrollPane scroll = new JScrollPane(raw);
    private final JPanel drawn = new JPanel(new BorderLayout());
    private final OfferedWords sections;
    private final WordLines none = new WordLines("counts none");
    private final transient Consumer<Picture> save;
    private transient List<Picture> pictures = List.of();

    LookPane(Consumer<Picture> save) {
        super(new GridLayout(1, 2, 24, 0));
        this.save = save;
        this.sections = new OfferedWords("sections", TEXTS.of("files.points"), List.of(), 0, this::draw);
        setName("look");
        setOpaque(false);
        scroll.setBorder(BorderFactory.createEmptyBorder());
        drawn.setOpaque(false);
        drawn.setBorder(BorderFactory.createEmptyBorder(0, 0, 0, 16));
        add(scroll);
        add(drawn);
        show(Optional.empty(), List.of(), TEXTS.of("take-in.look"));
    }

    /** Shows a file; {@code otherwise} stands where counts cannot be drawn. */
    void show(Optional<Look> look, List<Problem> problems, String otherwise) {
        scroll.getViewport().setBackground(Ink.SHEET.color());
        raw.show(
                look.map(Look::lines).orElse(List.of()),
                problems.stream()
                        .flatMap(problem -> FilePlace.of(problem).stream())
                        .toList());
        pictures = look.map(Look::pictures).orElse(List.of());
        none.show(List.of(WordLines.Sentence.second(otherwise)));
        sections.offer(
                IntStream.rangeClosed(1, pictures.size())
                        .mapToObj(number -> TEXTS.of("counts.section", number, pictures.size()))
                        .toList(),
                0);
        draw(0);
    }

    private void draw(int section) {
        drawn.removeAll();
        if (pictures.size() > 1) {
            drawn.add(sections, BorderLayout.NORTH);
        }
        drawn.add(section < pictures.size() ? view(pictures.get(section)) : blank(), BorderLayout.CENTER);
        drawn.revalidate();
        drawn.repaint();
    }

    private JComponent view(Picture picture) {
        PictureView view = new PictureView(picture, Ink::theme, save);
        view.setName("counts");
        return view;
    }

    private JComponent blank() {
        JPanel blank = new JPanel(new BorderLayout());
        blank.setOpaque(false);
        blank.setBorder(BorderFactory.createEmptyBorder(8, 0, 0, 0));
        blank.add(none, BorderLayout.NORTH);
        return blank;
    }

    /** The raw text. */
    RawText raw() {
        return raw;
    }

    /** What is drawn. */
    List<Picture> pictures() {
        return pictures;
    }

    /** Words of the house for labels. */
    static JLabel label(String words) {
        JLabel label = new JLabel(words);
        label.setFont(Type.BODY);
        label.setForeground(Ink.INK2.color());
        return label;
    }
}
