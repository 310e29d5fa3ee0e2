package bubblechain.sumrule;

import java.util.Optional;

/**
 * A singularity that stands in the way.
 *
 * @param obstacle      the singularity
 * @param contamination its part of the last order relative to the value (to the larger of value and error if it is farther
 *                      away); empty if its strength is unknown or the value is 0
 * @param reason        why it blocks, in words
 */
public record BlockedBy(Obstacle obstacle, Optional<Double> contamination, String reason) {}
