package fringekeep.desk.pane;

import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.drawing.Picture;
import fringekeep.drawing.PictureView;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Rectangle;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import javax.swing.JComponent;
import javax.swing.Scrollable;

/** The scrolled part of a record: drawings beside numbers, then columns of ruled facts. */
@SuppressWarnings("serial")
final class PageBody extends Painted implements Scrollable {
    private static final int GAP = 24;
    private static final int COLUMN = 224;

    private final transient List<PictureView> pictures = new ArrayList<>();
    private final transient List<JComponent> facts = new ArrayList<>();
    private transient Optional<BesidePanel> beside = Optional.empty();
    private int height = 10;
    private int sight = 500;

    void show(List<PictureView> views, Optional<BesidePanel> next, List<JComponent> groups) {
        removeAll();
        pictures.clear();
        pictures.addAll(views);
        beside = next;
        facts.clear();
        facts.addAll(groups);
        views.forEach(this::add);
        next.ifPresent(this::add);
        groups.forEach(this::add);
        revalidate();
        repaint();
    }

    List<PictureView> pictures() {
        return List.copyOf(pictures);
    }

    /** Height of the part in sight; the drawing takes about half of it. */
    void sight(int pixels) {
        sight = pixels;
        revalidate();
    }

    @Override
    public void doLayout() {
        height = lay(getWidth(), true);
    }

    private int lay(int width, boolean move) {
        int y = 8;
        boolean narrow = width < 520;
        int besideWidth = beside.isPresent() && !narrow ? BesidePanel.WIDTH + GAP : 0;
        int pictureWidth = Math.max(100, width - besideWidth);
        int besideBottom = y;
        if (beside.isPresent()) {
            Dimension size = beside.get().getPreferredSize();
            if (move) {
                beside.get().setBounds(width - BesidePanel.WIDTH, y, BesidePanel.WIDTH, size.height);
            }
            besideBottom = y + size.height;
        }
        for (PictureView picture : pictures) {
            int tall = tall(picture, pictureWidth);
            if (move) {
                picture.setBounds(0, y, pictureWidth, tall);
            }
            y += tall + 10;
        }
        y = Math.max(y, besideBottom + 10);
        return columns(width, y, move);
    }

    /** A drawing keeps its shape on paper, but one row of panels takes no more than about half of what is in sight. */
    private int tall(PictureView view, int width) {
        Picture picture = view.picture();
        double wanted = width * picture.heightMillimetres() / picture.widthMillimetres();
        boolean rows = picture.columns() > 1 && picture.panels().size() > picture.columns();
        double most = sight * (rows ? 0.95 : facts.size() > 3 ? 0.52 : 0.62);
        return (int) Math.max(220, Math.min(wanted, most));
    }

    private int columns(int width, int top, boolean move) {
        int count = Math.max(1, (width + GAP) / (COLUMN + GAP));
        int column = (width - GAP * (count - 1)) / count;
        int[] foot = new int[count];
        java.util.Arrays.fill(foot, top);
        for (JComponent group : facts) {
            int wide = group instanceof FactsPanel panel && panel.wide() && count > 1 ? 2 : 1;
            int best = 0;
            for (int i = 0; i + wide <= count; i++) {
                if (level(foot, i, wide) < level(foot, best, wide)) {
                    best = i;
                }
            }
            int y = level(foot, best, wide);
            int tall = group.getPreferredSize().height;
            if (move) {
                group.setBounds(best * (column + GAP), y, column * wide + GAP * (wide - 1), tall);
            }
            for (int i = best; i < best + wide; i++) {
                foot[i] = y + tall + 6;
            }
        }
        return level(foot, 0, count);
    }

    private static int level(int[] foot, int from, int count) {
        int level = 0;
        for (int i = from; i < from + count; i++) {
            level = Math.max(level, foot[i]);
        }
        return level;
    }

    @Override
    public Dimension getPreferredSize() {
        int width = getParent() == null ? 700 : Math.max(200, getParent().getWidth());
        return new Dimension(width, lay(width, false));
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        graphics.setColor(Ink.SHEET.color());
        graphics.fillRect(0, 0, getWidth(), Math.max(height, getHeight()));
    }

    @Override
    public Dimension getPreferredScrollableViewportSize() {
        return getPreferredSize();
    }

    @Override
    public int getScrollableUnitIncrement(Rectangle visible, int orientation, int direction) {
        return 22;
    }

    @Override
    public int getScrollableBlockIncrement(Rectangle visible, int orientation, int direction) {
        return Math.max(22, visible.height - 44);
    }

    @Override
    public boolean getScrollableTracksViewportWidth() {
        return true;
    }

    @Override
    public boolean getScrollableTracksViewportHeight() {
        return false;
    }
}
