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
import javax.swing.JComponent;
import javax.swing.Scrollable;

/** The scrolled part of a record: drawings beside numbers, then columns of ruled facts. */
@SuppressWarnings("serial")
final class PageBody extends Painted implements Scrollable {
    private static final int GAP = 24;
    private static final int COLUMN = 224;
    private static final int WIDE = 1250;
    private static final int NARROWEST = 90;

    private final transient List<PictureView> pictures = new ArrayList<>();
    private final transient List<JComponent> facts = new ArrayList<>();
    private final transient List<BesidePanel> besides = new ArrayList<>();
    private final transient List<TablePanel> tables = new ArrayList<>();
    private int height = 10;
    private int sight = 500;

    void show(List<PictureView> views, List<BesidePanel> beside, List<TablePanel> ruled, List<JComponent> groups) {
        removeAll();
        pictures.clear();
        pictures.addAll(views);
        besides.clear();
        besides.addAll(beside);
        tables.clear();
        tables.addAll(ruled);
        facts.clear();
        facts.addAll(groups);
        views.forEach(this::add);
        beside.forEach(this::add);
        ruled.forEach(this::add);
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

    private int lay(int whole, boolean move) {
        int aside = whole >= WIDE ? asideWidth() : 0;
        int width = whole - aside;
        int y = 8;
        boolean narrow = width < 520;
        int besideWidth = !besides.isEmpty() && !narrow ? BesidePanel.WIDTH + GAP : 0;
        int pictureWidth = Math.max(100, width - besideWidth);
        int besideBottom = y;
        for (BesidePanel beside : besides) {
            int tall = beside.getPreferredSize().height;
            if (move) {
                beside.setBounds(width - BesidePanel.WIDTH, besideBottom, BesidePanel.WIDTH, tall);
            }
            besideBottom += tall + 8;
        }
        for (PictureView picture : pictures) {
            int tall = tall(picture, pictureWidth);
            if (move) {
                picture.setBounds(0, y, pictureWidth, tall);
            }
            y += tall + 10;
        }
        y = narrow ? y + besideBottom : y;
        Room room = new Room(width, y, Math.max(y, besideBottom + 6), besideWidth);
        tables(room, move);
        int foot = columns(room, move);
        return aside > 0 ? Math.max(foot, aside(whole, aside - GAP, move)) : late(foot, width, move);
    }

    /** Where the next parts go: beside the column of numbers as long as that goes on, over the whole width below it. */
    private static final class Room {
        private final int width;
        private final int free;
        private final int taken;
        private int top;

        Room(int width, int top, int free, int taken) {
            this.width = width;
            this.top = top;
            this.free = free;
            this.taken = taken;
        }

        /** Width at the top; a little room left beside the numbers is passed over. */
        int width() {
            if (top + NARROWEST >= free) {
                top = Math.max(top, free);
            }
            return top < free ? width - taken : width;
        }
    }

    private void tables(Room room, boolean move) {
        for (TablePanel table : tables) {
            if (table.late()) {
                continue;
            }
            int width = Math.min(room.width(), Math.max(2 * COLUMN, (int) (1.2 * table.neededWidth())));
            if (move) {
                table.setBounds(0, room.top, width, table.height());
            }
            room.top += table.height() + 6;
        }
    }

    /** A drawing keeps its shape on paper, but one row of panels takes no more than about half of what is in sight. */
    private int tall(PictureView view, int width) {
        Picture picture = view.picture();
        double wanted = width * picture.heightMillimetres() / picture.widthMillimetres();
        boolean rows = picture.columns() > 1 && picture.panels().size() > picture.columns();
        double most = sight * (rows ? 0.95 : facts.size() > 3 ? 0.52 : 0.62);
        return (int) Math.max(220, Math.min(wanted, most));
    }

    private int asideWidth() {
        return tables.stream()
                .filter(TablePanel::late)
                .mapToInt(table -> Math.min(420, table.neededWidth()) + GAP)
                .max()
                .orElse(0);
    }

    private int aside(int whole, int width, boolean move) {
        int y = 8;
        for (TablePanel table : tables) {
            if (table.late()) {
                if (move) {
                    table.setBounds(whole - width, y, width, table.height());
                }
                y += table.height() + 6;
            }
        }
        return y;
    }

    private int late(int top, int width, boolean move) {
        int y = top;
        for (TablePanel table : tables) {
            if (table.late()) {
                if (move) {
                    table.setBounds(0, y, Math.min(width, table.neededWidth() + 60), table.height());
                }
                y += table.height() + 6;
            }
        }
        return y;
    }

    private int columns(Room room, boolean move) {
        int width = room.width();
        int count = Math.max(1, (width + GAP) / (COLUMN + GAP));
        int column = (width - GAP * (count - 1)) / count;
        int[] foot = new int[count];
        java.util.Arrays.fill(foot, room.top);
        for (JComponent group : facts) {
            FactColumn asking = (FactColumn) group;
            int wide = asking.wide() && count > 1 ? 2 : 1;
            int best = 0;
            for (int i = 0; i + wide <= count; i++) {
                if (level(foot, i, wide) < level(foot, best, wide)) {
                    best = i;
                }
            }
            int y = level(foot, best, wide);
            int given = column * wide + GAP * (wide - 1);
            int tall = asking.heightIn(given);
            if (move) {
                group.setBounds(best * (column + GAP), y, given, tall);
            }
            for (int i = best; i < best + wide; i++) {
                foot[i] = y + tall + 6;
            }
        }
        return Math.max(level(foot, 0, count), room.free);
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
