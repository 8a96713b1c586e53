package fringekeep.scan.internal.reading;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.archive.json.JsonDocument;
import fringekeep.archive.json.JsonObject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.scan.internal.ProfileRules;
import java.nio.charset.StandardCharsets;

/** Reading profiles for tests, written as JSON with single quotes. */
public final class Profiles {
    /** The golden profile of record format 17. */
    public static final String GOLDEN = """
            {'columns':[{'axis':'position','unit':'nm'},{'channel':'counts'}],'decimal':'.','delimiter':',',
             'encoding':'UTF-8','exposure':{'si':1,'text':'1','uncertainty':{'sort':'exact'},'unit':'s'},
             'form':'delimited/1','skip':1}""";

    /** Tab, comment header, UTF-8. */
    public static final String TAB = """
            {'form':'delimited/1','encoding':'UTF-8','delimiter':'\\t','decimal':'.','skip':1,'comment':'#',
             'columns':[{'axis':'position','unit':'nm','positions':'set'},{'channel':'counts','saturation':1000}],
             'header':[{'key':'start','moment':'start'},{'key':'end','moment':'end'},{'key':'points','rows':true},
              {'key':'dwell','exposure':true},
              {'key':'laser power','setting':'laser power','unit':'W','deviation':'0.02'},
              {'key':'operator','personal':true}]}""";

    /** Semicolon, decimal comma, Latin-1, data marker. */
    public static final String SEMICOLON = """
            {'form':'delimited/1','encoding':'ISO-8859-1','delimiter':';','decimal':',','skip':1,'dataMarker':'Daten',
             'columns':[{'axis':'position','unit':'um','number':1},{'channel':'counts','header':'Zählung'},
              {'channel':'monitor','unit':'V','means':'monitor','number':3},
              {'channel':'dark','means':'dark','number':4,'highest':2}],
             'header':[{'key':'Beginn','moment':'start','format':'dd.MM.yyyy HH:mm:ss','zone':'Etc/GMT-2'},
              {'key':'Messzeit / s','exposure':true},{'key':'Laserleistung / W','setting':'laser power','unit':'W'},
              {'key':'Quelle / °C','setting':'source temperature','unit':'Cel'}]}""";

    /** Comma, units in the header row, sections. */
    public static final String SECTIONS = """
            {'form':'delimited/1','encoding':'US-ASCII','delimiter':',','decimal':'.','skip':4,'sectionMarker':'[scan ',
             'columns':[{'axis':'position','unit':'nm'},{'channel':'resonant'},
              {'channel':'off-resonant','means':'off-resonant'}],
             'header':[{'key':'start','moment':'start'},{'key':'shots','shots':true},
              {'key':'pulse energy 2 (mJ)','setting':'pulse energy','unit':'mJ'}]}""";

    private Profiles() {}

    /** Content of a profile, which must keep to the rules. */
    public static JsonObject content(String json) throws ProblemException {
        JsonObject content = any(json);
        assertThat(ProfileRules.examine(content)).isEmpty();
        return content;
    }

    /** Content of a profile as it is. */
    public static JsonObject any(String json) throws ProblemException {
        byte[] bytes = json.replace('\'', '"').getBytes(StandardCharsets.UTF_8);
        return (JsonObject) JsonDocument.read(bytes).value();
    }

    static FileReader reader(String profile, String text) throws ProblemException {
        Profile read = Profile.of(content(profile));
        return new FileReader(read, text.getBytes(java.nio.charset.Charset.forName(read.encoding())), "test.txt");
    }

    static Reading read(String profile, String text) throws ProblemException {
        return reader(profile, text).read(0);
    }
}
