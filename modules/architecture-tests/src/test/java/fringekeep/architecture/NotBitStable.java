package fringekeep.architecture;

import com.tngtech.archunit.core.domain.JavaAccess;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.lang.ArchCondition;
import com.tngtech.archunit.lang.ConditionEvents;
import com.tngtech.archunit.lang.SimpleConditionEvent;
import java.util.Set;

/** Calls of {@code java.lang.Math} that a platform may answer differently in the last bit. */
final class NotBitStable {
    private static final Set<String> FUNCTIONS = Set.of(
            "sin", "cos", "tan", "asin", "acos", "atan", "atan2", "exp", "expm1", "log", "log10", "log1p", "pow",
            "cbrt", "sinh", "cosh", "tanh", "hypot");

    static final ArchCondition<JavaClass> CALLS = new ArchCondition<>("call transcendental functions of Math") {
        @Override
        public void check(JavaClass type, ConditionEvents events) {
            for (JavaAccess<?> access : type.getAccessesFromSelf()) {
                boolean called = access.getTargetOwner().isEquivalentTo(Math.class)
                        && FUNCTIONS.contains(access.getTarget().getName());
                if (called) {
                    events.add(SimpleConditionEvent.satisfied(access, access.getDescription()));
                }
            }
        }
    };

    private NotBitStable() {}
}
