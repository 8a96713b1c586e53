/**
 * Selections of fits, molecular properties derived from them, and quoted values to stand beside.
 *
 * <p>What lives here: which fits are taken and why others are not, how a property is asked for and recorded. What may never:
 * the physics itself, which is in interferometry. Depends on archive, drawing, interferometry and the stages before. Pure and
 * stateless but for the verbs, which take an archive.
 */
@org.jspecify.annotations.NullMarked
package fringekeep.property;
