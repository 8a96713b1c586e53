package fringekeep.desk.window;

import fringekeep.desk.list.RecordList;
import fringekeep.desk.look.Ink;
import fringekeep.desk.look.Painted;
import fringekeep.desk.look.Pen;
import fringekeep.desk.pane.RecordPane;
import java.awt.BasicStroke;
import java.awt.Cursor;
import java.awt.Graphics;
import java.awt.event.MouseAdapter;
import java.awt.event.MouseEvent;
import java.awt.geom.Path2D;
import java.util.OptionalInt;
import java.util.function.IntConsumer;

/** List, gap with the tie, record. The gap is dragged to give the list more or less room. */
@SuppressWarnings("serial")
final class TwoPanes extends Painted {
    private static final int GAP = 36;
    private static final int LEAST_LIST = 236;
    private static final int LEAST_RECORD = 560;
    private static final int MARGIN = 16;

    private final RecordList list;
    private final RecordPane record;
    private final Tie tie = new Tie();
    private int listWidth = -1;

    TwoPanes(RecordList list, RecordPane record, IntConsumer widthChosen) {
        this.list = list;
        this.record = record;
        setOpaque(true);
        add(list);
        add(tie);
        add(record);
        list.onScroll(tie::repaint);
        MouseAdapter drag = new MouseAdapter() {
            @Override
            public void mouseDragged(MouseEvent event) {
                listWidth = tie.getX() + event.getX() - GAP / 2;
                revalidate();
            }

            @Override
            public void mouseReleased(MouseEvent event) {
                widthChosen.accept(listWidth);
            }
        };
        tie.addMouseListener(drag);
        tie.addMouseMotionListener(drag);
    }

    /** Gives the list a width; a negative one means the usual share. */
    void listWidth(int width) {
        listWidth = width;
        revalidate();
    }

    void retie() {
        tie.repaint();
    }

    @Override
    public void doLayout() {
        int width = getWidth();
        int wanted = listWidth < 0 ? width < 1600 ? 508 : width * 45 / 100 : listWidth;
        int listRoom = Math.max(LEAST_LIST, Math.min(wanted, width - GAP - LEAST_RECORD - MARGIN));
        list.setBounds(0, 0, listRoom, getHeight());
        tie.setBounds(listRoom, 0, GAP, getHeight());
        record.setBounds(listRoom + GAP, 0, width - listRoom - GAP - MARGIN, getHeight());
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        graphics.setColor(Ink.SHEET.color());
        graphics.fillRect(0, 0, getWidth(), getHeight());
    }

    /** The line from the selected row to the record's title. */
    private final class Tie extends Painted {
        Tie() {
            setCursor(Cursor.getPredefinedCursor(Cursor.E_RESIZE_CURSOR));
        }

        @Override
        protected void paintComponent(Graphics graphics) {
            try (Pen pen = new Pen(graphics)) {
                pen.fill(Ink.SHEET.color(), 0, 0, getWidth(), getHeight());
                pen.upright(Ink.HAIR, 14, 0, getHeight());
                OptionalInt row = list.rowMiddle();
                if (row.isEmpty() || record.page().isEmpty()) {
                    return;
                }
                int y = row.getAsInt();
                Path2D path = new Path2D.Double();
                if (y < list.rowsTop()) {
                    path.moveTo(8, list.rowsTop());
                    path.lineTo(14.5, list.rowsTop());
                } else if (y > getHeight()) {
                    path.moveTo(8, getHeight() - 1.0);
                    path.lineTo(14.5, getHeight() - 1.0);
                } else {
                    path.moveTo(0, y);
                    path.lineTo(14.5, y);
                }
                path.lineTo(14.5, 22);
                path.lineTo(GAP - 6.0, 22);
                pen.graphics().setColor(Ink.STRONG.color());
                pen.graphics().setStroke(new BasicStroke(1.6f));
                pen.graphics().draw(path);
            }
        }
    }
}
