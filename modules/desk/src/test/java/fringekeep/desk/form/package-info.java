/** Tests of forms. */
@org.jspecify.annotations.NullMarked
package fringekeep.desk.form;
