package fringekeep.scan;

import fringekeep.archive.json.JsonObject;
import fringekeep.archive.quantity.Quantity;
import fringekeep.archive.quantity.QuantityJson;
import fringekeep.archive.quantity.ValueText;
import fringekeep.scan.SettingsFacet.Setting;

/** Turns recorded quantities into settings in SI. */
final class Settings {
    private Settings() {}

    /** A setting from a name and a quantity as recorded. */
    static Setting of(String name, JsonObject json) {
        Quantity quantity = QuantityJson.read(json);
        return new Setting(
                name, quantity.si(), QuantityJson.deviation(quantity), quantity.unit(), ValueText.brief(quantity));
    }
}
