/**
 * Reading the files users write by hand: TOML in which every number is a string, with complaints that name file, line
 * and column.
 *
 * <p>{@link bubblechain.toml.TomlFile} opens a file within its limits; {@link bubblechain.toml.TomlSection} hands out
 * its entries. What the entries mean is settled by {@code kernel} and {@code fixedorder}.
 */
@NullMarked
package bubblechain.toml;

import org.jspecify.annotations.NullMarked;
