package nightjar.analysis;

import nightjar.film.Scratch;
import nightjar.numeric.Workers;

/**
 * What stages run on.
 *
 * @param workers threads
 * @param scratch where large arrays live
 * @param stages hears which stage runs
 */
record Machine(Workers workers, Scratch scratch, StageRecorder stages) {}
