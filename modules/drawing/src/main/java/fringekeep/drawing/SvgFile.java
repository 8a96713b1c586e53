package fringekeep.drawing;

import java.io.IOException;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Base64;
import java.util.Set;
import java.util.TreeSet;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.apache.batik.svggen.SVGGeneratorContext;
import org.apache.batik.svggen.SVGGraphics2D;
import org.w3c.dom.Document;
import org.w3c.dom.Element;

/**
 * A picture as SVG 1.1: text stays text, the letters used are embedded, and the plotted numbers stand in the element
 * {@code metadata}, so that a reader needs nothing else.
 */
final class SvgFile {
    private static final String SVG = "http://www.w3.org/2000/svg";

    private SvgFile() {}

    static byte[] write(Picture picture, Theme theme) {
        Document document = document();
        SVGGeneratorContext context = SVGGeneratorContext.createDefault(document);
        context.setComment("");
        context.setPrecision(3);
        SVGGraphics2D g = new SVGGraphics2D(context, false);
        double width = picture.widthMillimetres() * PictureFiles.POINTS_PER_MILLIMETRE;
        double height = picture.heightMillimetres() * PictureFiles.POINTS_PER_MILLIMETRE;
        new PicturePainter(g, theme, Measures.PAPER).paint(picture, width, height);
        Element root = g.getRoot();
        root.setAttribute("width", NumberText.full(picture.widthMillimetres()) + "mm");
        root.setAttribute("height", NumberText.full(picture.heightMillimetres()) + "mm");
        root.setAttribute("viewBox", "0 0 " + rounded(width) + " " + rounded(height));
        describe(document, root, picture);
        StringWriter text = new StringWriter();
        try {
            g.stream(root, text, true, false);
        } catch (IOException e) {
            throw new UncheckedIOException("writing to memory", e);
        }
        return text.toString().replace("\r\n", "\n").getBytes(StandardCharsets.UTF_8);
    }

    private static void describe(Document document, Element root, Picture picture) {
        Element style = element(document, "style", fontFace(root.getTextContent()));
        style.setAttribute("type", "text/css");
        Element metadata =
                element(document, "metadata", new String(PlottedNumbers.csv(picture), StandardCharsets.UTF_8));
        root.insertBefore(style, root.getFirstChild());
        root.insertBefore(metadata, style);
        if (!picture.title().isEmpty()) {
            root.insertBefore(element(document, "title", picture.title()), metadata);
        }
    }

    private static String fontFace(String letters) {
        Set<Integer> used = new TreeSet<>();
        letters.codePoints().filter(c -> c > ' ').forEach(used::add);
        String face = Base64.getEncoder().encodeToString(FaceSubset.of(used));
        return "@font-face{font-family:Roboto;src:url(data:font/ttf;base64," + face + ")}";
    }

    private static Element element(Document document, String name, String text) {
        Element element = document.createElementNS(SVG, name);
        element.appendChild(document.createTextNode(text));
        return element;
    }

    private static String rounded(double value) {
        return NumberText.full(Math.rint(value * 1000) / 1000);
    }

    private static Document document() {
        try {
            DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
            factory.setNamespaceAware(true);
            return factory.newDocumentBuilder().getDOMImplementation().createDocument(SVG, "svg", null);
        } catch (ParserConfigurationException e) {
            throw new IllegalStateException("every Java platform has an XML builder", e);
        }
    }
}
