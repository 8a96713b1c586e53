package fringekeep.desk.list;

import fringekeep.archive.record.Hash;
import java.util.List;

/** What a person does in a list. All methods are called on the window thread. */
public interface ListEar {
    /** A record is in hand. */
    void select(Hash record);

    /** Which records are selected changed. */
    void marked();

    /** Goes into the record. */
    void enter();

    /** Another list is wanted. */
    void ask(Question question);

    /** A page came in sight; to be answered by {@link RecordList#arrived}. */
    void page(PagedRows rows, int page);

    /** Rows are to be copied as a table. */
    void copy(ListContent content, List<Hash> records);

    /** Columns were chosen for a kind; none: the usual ones. */
    void columns(String kind, List<String> columns);

    /** Columns that can be chosen for a kind. */
    List<ListContent.Head> offered(String kind);
}
