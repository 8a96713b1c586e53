package fringekeep.desk.window;

import java.awt.BorderLayout;
import java.awt.Component;
import java.awt.Image;
import java.awt.Point;
import java.awt.Rectangle;
import java.awt.Shape;
import java.awt.event.ActionListener;
import java.awt.image.BufferedImage;
import java.util.ArrayList;
import java.util.List;
import javax.swing.Action;
import javax.swing.Icon;
import javax.swing.JPanel;
import javax.swing.event.ChangeEvent;
import javax.swing.event.ChangeListener;
import org.netbeans.swing.tabcontrol.customtabs.Tabbed;
import org.openide.windows.TopComponent;

/** Stands where the platform would show tabs: the selected component alone, without any tab, border or button. */
final class OneSheetTabs extends Tabbed {
    private final List<TopComponent> components = new ArrayList<>();
    private final List<ChangeListener> changes = new ArrayList<>();
    private final JPanel ground = new JPanel(new BorderLayout());
    private int selected = -1;

    @Override
    public void addTopComponent(String name, Icon icon, TopComponent component, String toolTip) {
        insertComponent(name, icon, component, toolTip, components.size());
    }

    @Override
    public void insertComponent(String name, Icon icon, Component component, String toolTip, int position) {
        if (component instanceof TopComponent sheet) {
            components.add(position, sheet);
            if (selected >= position) {
                selected++;
            }
            if (selected < 0) {
                setSelectedComponent(sheet);
            }
        }
    }

    @Override
    public void setTopComponents(TopComponent[] sheets, TopComponent chosen) {
        components.clear();
        components.addAll(List.of(sheets));
        selected = -1;
        setSelectedComponent(chosen);
    }

    @Override
    public int getTabCount() {
        return components.size();
    }

    @Override
    public TopComponent[] getTopComponents() {
        return components.toArray(TopComponent[]::new);
    }

    @Override
    public TopComponent getTopComponentAt(int index) {
        return components.get(index);
    }

    @Override
    public int indexOf(Component component) {
        return components.indexOf(component);
    }

    @Override
    public void removeComponent(Component component) {
        int at = components.indexOf(component);
        if (at < 0) {
            return;
        }
        components.remove(at);
        int next = Math.min(at == selected ? at : selected > at ? selected - 1 : selected, components.size() - 1);
        selected = -1;
        show(next);
    }

    @Override
    public void setSelectedComponent(Component component) {
        int at = components.indexOf(component);
        if (at != selected || ground.getComponentCount() == 0) {
            show(at);
        }
    }

    private void show(int at) {
        selected = at;
        ground.removeAll();
        if (at >= 0) {
            ground.add(components.get(at), BorderLayout.CENTER);
        }
        ground.revalidate();
        ground.repaint();
        ChangeEvent event = new ChangeEvent(this);
        List.copyOf(changes).forEach(listener -> listener.stateChanged(event));
    }

    @Override
    @SuppressWarnings("NullAway") // the platform asks for null when nothing is selected
    public TopComponent getSelectedTopComponent() {
        return selected < 0 ? null : components.get(selected);
    }

    @Override
    public void addChangeListener(ChangeListener listener) {
        changes.add(listener);
    }

    @Override
    public void removeChangeListener(ChangeListener listener) {
        changes.remove(listener);
    }

    @Override
    public Component getComponent() {
        return ground;
    }

    @Override
    public int tabForCoordinate(Point point) {
        return -1;
    }

    @Override
    public Shape getIndicationForLocation(Point location, TopComponent dragged, Point start, boolean attaching) {
        return new Rectangle(ground.getSize());
    }

    @Override
    public Object getConstraintForLocation(Point location, boolean attachingPossible) {
        return "";
    }

    @Override
    public Image createImageOfTab(int index) {
        return new BufferedImage(1, 1, BufferedImage.TYPE_INT_ARGB);
    }

    @Override
    public Action[] getPopupActions(Action[] defaults, int index) {
        return new Action[0];
    }

    @Override
    public Rectangle getTabBounds(int index) {
        return new Rectangle();
    }

    @Override
    public Rectangle getTabsArea() {
        return new Rectangle();
    }

    @Override
    public boolean isTransparent() {
        return false;
    }

    // There are no tabs: titles, icons, tool tips, attention and tab actions have nowhere to show.

    @Override
    public void requestAttention(TopComponent component) {}

    @Override
    public void cancelRequestAttention(TopComponent component) {}

    @Override
    public void setTitleAt(int index, String title) {}

    @Override
    public void setIconAt(int index, Icon icon) {}

    @Override
    public void setToolTipTextAt(int index, String toolTip) {}

    @Override
    public void addActionListener(ActionListener listener) {}

    @Override
    public void removeActionListener(ActionListener listener) {}

    @Override
    public void setActive(boolean active) {}

    @Override
    public void setTransparent(boolean transparent) {}
}
