package fringekeep.archive.graph;

import static fringekeep.archive.graph.GraphData.NONE;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

/** Lists the links of one record, its own first, in the order of its head. */
final class LinkReading {
    private final GraphData data;

    LinkReading(GraphData data) {
        this.data = data;
    }

    List<Graph.Link> links(int node) {
        List<Graph.Link> links = new ArrayList<>();
        int first = data.firstLink.get(node);
        for (int link = first; link < first + data.inputCount.get(node) + data.aboutCount.get(node); link++) {
            links.add(link(link));
        }
        add(links, node, data.corrects.get(node), Graph.LinkSort.CORRECTS);
        add(links, node, data.after.get(node), Graph.LinkSort.AFTER);
        chained(links, data.users.get(node));
        chained(links, data.judging.get(node));
        for (int other = data.corrector.get(node); other != NONE; other = data.correctorNext.get(other)) {
            add(links, other, node, Graph.LinkSort.CORRECTS);
        }
        for (int other = data.follower.get(node); other != NONE; other = data.followerNext.get(other)) {
            add(links, other, node, Graph.LinkSort.AFTER);
        }
        return links;
    }

    private void chained(List<Graph.Link> links, int first) {
        List<Graph.Link> found = new ArrayList<>();
        for (int link = first; link != NONE; link = data.linkNext.get(link)) {
            found.add(link(link));
        }
        Collections.reverse(found);
        links.addAll(found);
    }

    private Graph.Link link(int link) {
        return new Graph.Link(
                data.hash(data.linkSource.get(link)),
                data.hash(data.linkTarget.get(link)),
                data.isAbout(link) ? Graph.LinkSort.ABOUT : Graph.LinkSort.INPUT,
                data.roleName(link));
    }

    private void add(List<Graph.Link> links, int from, int to, Graph.LinkSort sort) {
        if (from != NONE && to != NONE) {
            links.add(new Graph.Link(data.hash(from), data.hash(to), sort, ""));
        }
    }
}
