package fringekeep.drawing;

import de.rototor.pdfbox.graphics2d.PdfBoxGraphics2D;
import de.rototor.pdfbox.graphics2d.PdfBoxGraphics2DFontTextDrawer;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.PDPage;
import org.apache.pdfbox.pdmodel.PDPageContentStream;
import org.apache.pdfbox.pdmodel.common.PDRectangle;
import org.apache.pdfbox.pdmodel.font.PDType0Font;

/** A picture as a PDF of one page of its size. Carries no date and a fixed document id. */
final class PdfFile {
    private PdfFile() {}

    static byte[] write(Picture picture, Theme theme) {
        float width = (float) (picture.widthMillimetres() * PictureFiles.POINTS_PER_MILLIMETRE);
        float height = (float) (picture.heightMillimetres() * PictureFiles.POINTS_PER_MILLIMETRE);
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (PDDocument document = new PDDocument();
                InputStream face = Lettering.regularFace()) {
            document.setDocumentId(1L);
            document.getDocumentInformation().setTitle(picture.title());
            PDPage page = new PDPage(new PDRectangle(width, height));
            document.addPage(page);
            PdfBoxGraphics2D g = new PdfBoxGraphics2D(document, width, height);
            PdfBoxGraphics2DFontTextDrawer letters = new PdfBoxGraphics2DFontTextDrawer();
            letters.registerFont("Roboto", PDType0Font.load(document, face, true));
            g.setFontTextDrawer(letters);
            new PicturePainter(g, theme, Measures.PAPER).paint(picture, width, height);
            g.dispose();
            try (PDPageContentStream content = new PDPageContentStream(document, page)) {
                content.drawForm(g.getXFormObject());
            }
            document.save(bytes);
        } catch (IOException e) {
            throw new IllegalStateException("writing a page to memory", e);
        }
        return bytes.toByteArray();
    }
}
