/** What windows share: chain strip, lists, record panes, runner, problem dialog. */
@org.jspecify.annotations.NullMarked
package fringekeep.desk;
