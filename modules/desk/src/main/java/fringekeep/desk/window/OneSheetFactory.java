package fringekeep.desk.window;

import org.netbeans.swing.tabcontrol.WinsysInfoForTabbedContainer;
import org.netbeans.swing.tabcontrol.customtabs.Tabbed;
import org.netbeans.swing.tabcontrol.customtabs.TabbedComponentFactory;
import org.netbeans.swing.tabcontrol.customtabs.TabbedType;
import org.openide.util.lookup.ServiceProvider;

/** Gives the platform a place for its components that shows no tabs. */
@ServiceProvider(service = TabbedComponentFactory.class, position = 10)
public final class OneSheetFactory implements TabbedComponentFactory {
    @Override
    public Tabbed createTabbedComponent(TabbedType type, WinsysInfoForTabbedContainer info) {
        return new OneSheetTabs();
    }
}
