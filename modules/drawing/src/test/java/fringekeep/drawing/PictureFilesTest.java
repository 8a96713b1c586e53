package fringekeep.drawing;

import static org.assertj.core.api.Assertions.assertThat;

import fringekeep.drawing.PictureFiles.Form;
import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.HashSet;
import java.util.Locale;
import java.util.Set;
import java.util.TimeZone;
import javax.imageio.ImageIO;
import javax.xml.parsers.DocumentBuilderFactory;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.w3c.dom.Document;

class PictureFilesTest {
    @Test
    void svgIsWellFormedAndHoldsThePlottedNumbersAndTheWordsAsText() throws Exception {
        byte[] svg = PictureFiles.write(Samples.fringe(), Form.SVG);

        DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
        factory.setNamespaceAware(true);
        factory.setFeature("http://apache.org/xml/features/nonvalidating/load-external-dtd", false);
        Document document = factory.newDocumentBuilder().parse(new ByteArrayInputStream(svg));
        assertThat(document.getDocumentElement().getAttribute("width")).isEqualTo("130mm");
        String numbers = document.getElementsByTagName("metadata").item(0).getTextContent();
        assertThat(numbers.lines().filter(row -> row.contains(",counts,points,")))
                .hasSize(31);
        assertThat(numbers)
                .isEqualTo(new String(PictureFiles.write(Samples.fringe(), Form.CSV), StandardCharsets.UTF_8));
        assertThat(document.getDocumentElement().getTextContent())
                .contains("position of grating 3 / nm")
                .contains("font-family:Roboto");
        assertThat(document.getElementsByTagName("text").getLength()).isGreaterThan(10);
    }

    @ParameterizedTest
    @EnumSource(Form.class)
    void bytesAreTheSameUnderEveryLocaleAndZone(Form form) {
        Locale locale = Locale.getDefault();
        TimeZone zone = TimeZone.getDefault();
        Set<String> seen = new HashSet<>();
        try {
            for (String tag : new String[] {"en", "de", "tr", "ar-EG-u-nu-arab"}) {
                for (String place : new String[] {"UTC", "Pacific/Chatham"}) {
                    Locale.setDefault(Locale.forLanguageTag(tag));
                    TimeZone.setDefault(TimeZone.getTimeZone(place));
                    seen.add(new String(PictureFiles.write(Samples.power(), form), StandardCharsets.ISO_8859_1));
                }
            }
        } finally {
            Locale.setDefault(locale);
            TimeZone.setDefault(zone);
        }

        assertThat(seen).hasSize(1);
    }

    @Test
    void pdfPageHasTheSizeOfThePictureAndTextThatCanBeSearched() throws IOException {
        byte[] pdf = PictureFiles.write(Samples.power(), Form.PDF);

        try (PDDocument document = Loader.loadPDF(pdf)) {
            assertThat(document.getNumberOfPages()).isEqualTo(1);
            // 1 inch = 25.4 mm = 72 points (ISO 32000-1, 8.3.2.3).
            assertThat((double) document.getPage(0).getMediaBox().getWidth())
                    .isCloseTo(180 / 25.4 * 72, org.assertj.core.data.Offset.offset(0.001));
            assertThat((double) document.getPage(0).getMediaBox().getHeight())
                    .isCloseTo(70 / 25.4 * 72, org.assertj.core.data.Offset.offset(0.001));
            assertThat(new PDFTextStripper().getText(document)).contains("laser power / W", "classical");
        }
    }

    @Test
    void pngHasTheSizeInPixelsAndManyColours() throws IOException {
        byte[] png = PictureFiles.write(Samples.fringe(), Form.PNG);

        BufferedImage image = ImageIO.read(new ByteArrayInputStream(png));
        // 130 mm at 300 to the inch.
        assertThat(image.getWidth()).isEqualTo((int) Math.ceil(130 / 25.4 * 300));
        assertThat(colours(image)).hasSizeGreaterThan(20);
    }

    @Test
    void darkAndLightScreensDiffer() {
        BufferedImage light = PictureFiles.screen(Samples.fringe(), Theme.LIGHT, 500, 300);
        BufferedImage dark = PictureFiles.screen(Samples.fringe(), Theme.DARK, 500, 300);

        assertThat(light.getRGB(499, 299) & 0xFFFFFF).isEqualTo(0xFCFBF7);
        assertThat(dark.getRGB(499, 299) & 0xFFFFFF).isEqualTo(0x191D20);
        assertThat(colours(light)).contains(0x0072B2);
        assertThat(colours(dark)).contains(0x56B4E9);
    }

    @Test
    void anEmptyPictureIsDrawnWithoutData() {
        Panel panel = new Panel("", "", Axis.linear("x", ""), Axis.linear("y", ""), java.util.List.of(), 1, true);
        Picture empty = new Picture("", 60, 40, 1, java.util.List.of(panel));

        for (Form form : Form.values()) {
            assertThat(PictureFiles.write(empty, form)).isNotEmpty();
        }
    }

    private static Set<Integer> colours(BufferedImage image) {
        Set<Integer> colours = new HashSet<>();
        for (int y = 0; y < image.getHeight(); y++) {
            for (int x = 0; x < image.getWidth(); x++) {
                colours.add(image.getRGB(x, y) & 0xFFFFFF);
            }
        }
        return colours;
    }
}
