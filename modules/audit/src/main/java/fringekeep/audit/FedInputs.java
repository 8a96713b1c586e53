package fringekeep.audit;

import fringekeep.archive.kind.Input;
import fringekeep.archive.kind.Inputs;
import fringekeep.archive.kind.Kinds;
import fringekeep.archive.kind.RecordView;
import fringekeep.archive.kind.Subject;
import fringekeep.archive.problem.ProblemException;
import fringekeep.archive.record.Hash;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Inputs in which some records, at whatever depth, are seen with the result that came out anew instead of the recorded one. A
 * kind cannot tell the difference.
 *
 * @param recorded the inputs as recorded
 * @param anew records by fingerprint as they are to be seen; those not named are seen as recorded
 * @param kinds who turns records into facets
 */
record FedInputs(Inputs recorded, Map<Hash, RecordView> anew, Kinds kinds) implements Inputs {
    @Override
    public List<Input> all() {
        return recorded.all().stream().<Input>map(Fed::new).toList();
    }

    @Override
    public List<Subject> about() {
        return recorded.about();
    }

    /** One input seen so. */
    private final class Fed implements Input {
        private final Input input;

        Fed(Input input) {
            this.input = input;
        }

        @Override
        public int position() {
            return input.position();
        }

        @Override
        public String role() {
            return input.role();
        }

        @Override
        public Optional<String> channel() {
            return input.channel();
        }

        @Override
        public Hash target() {
            return input.target();
        }

        @Override
        public boolean raw() {
            return input.raw();
        }

        @Override
        public Optional<RecordView> record() {
            RecordView view = anew.get(target());
            return view == null ? input.record() : Optional.of(view);
        }

        @Override
        public Optional<byte[]> rawBytes() throws ProblemException {
            return input.rawBytes();
        }

        @Override
        public Inputs inputs() {
            return new FedInputs(input.inputs(), anew, kinds);
        }

        @Override
        public <T> Optional<T> facet(Class<T> facet) {
            if (raw()) {
                return Optional.empty();
            }
            return record().flatMap(view -> kinds.get(view.head().kind())
                    .filter(kind -> view.head().schema() <= kind.schema())
                    .flatMap(kind -> kind.facet(facet, view, inputs())));
        }
    }
}
