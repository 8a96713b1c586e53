/** Forms over any kind that people enter, made from its schema. */
@org.jspecify.annotations.NullMarked
package fringekeep.desk.form;
