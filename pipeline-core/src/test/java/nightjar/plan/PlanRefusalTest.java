package nightjar.plan;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Each refusal is one sentence with the file, line, column, value and remedy. */
class PlanRefusalTest {
  @Test
  void anUnknownKeyNamesTheNearest() {
    assertEquals(
        "p.yaml, line 3, column 3: the key is unknown (found drift.cutof_s, expected cutoff_s);"
            + " did you mean cutoff_s.",
        Plans.refusalWith("drift:\n  cutof_s: 120\n"));
    String top = Plans.refusalWith("smooting: {fwhm_mm: 0}");
    assertTrue(top.startsWith("p.yaml, line 2, column 1: the key is unknown"), top);
    assertTrue(top.endsWith("did you mean smoothing."), top);
  }

  @Test
  void aKeyThatIsLikeNoOtherIsToBeLeftOut() {
    assertTrue(Plans.refusalWith("mask: {zzzzzzzzzz: 1}").endsWith("; leave it out."));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "recording: {x: 1}",
        "screening: {x: 1}",
        "alignment: {x: 1}",
        "smoothing: {x: 1}",
        "mask: {x: 1}",
        "kernel: {x: 1}",
        "stimuli: {a: {x: 1}}",
        "drift: {x: 1}",
        "nuisance: {x: 1}",
        "noise: {x: 1}",
        "inference: {x: 1}",
        "regions: {x: 1}",
        "responses: {x: 1}",
        "sham_check: {x: 1}",
        "verdict: {x: 1}",
        "x: 1",
      })
  void everySectionRefusesUnknownKeys(String rest) {
    String sentence = Plans.refusalWith(rest);
    assertTrue(sentence.contains("line 2, column " + (rest.indexOf("x: 1") + 1) + ": "), sentence);
    assertTrue(sentence.contains("the key is unknown"), sentence);
  }

  @Test
  void aContrastRefusesUnknownKeys() {
    String sentence = Plans.refusalOf("contrasts:\n- {name: a, weights: {a: 1}, weight: 1}");
    assertTrue(sentence.startsWith("p.yaml, line 2, column 30: the key is unknown"), sentence);
    assertTrue(sentence.endsWith("did you mean weights."), sentence);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          screening: {z_limit: wide}            | screening.z_limit has the wrong type (found wide, expected a number)
          screening: {z_limit: '3'}             | screening.z_limit has the wrong type (found 3, expected a number)
          screening: {z_limit: null}            | screening.z_limit has the wrong type (found null, expected a number)
          screening: {z_limit: [1]}             | screening.z_limit has the wrong type (found a list, expected a number)
          screening: {z_limit: .inf}            | screening.z_limit has the wrong type
          screening: {z_limit: .nan}            | screening.z_limit has the wrong type
          screening: {z_limit: 0x10}            | screening.z_limit has the wrong type (found 0x10, expected a decimal number)
          screening: {enabled: yes}             | screening.enabled has the wrong type (found yes, expected true or false)
          screening: {window_frames: 31.5}      | screening.window_frames is no whole number (found 31.5)
          screening: {window_frames: 30}        | screening.window_frames is even (found 30)
          screening: on                         | screening has the wrong type (found on, expected a map of keys)
          screening:                            | screening has the wrong type (found nothing, expected a map of keys)
          mask: [auto]                          | mask has the wrong type (found a list, expected a map of keys)
          mask: {source: automatic}             | mask.source is none of the words it can be (found automatic, expected auto, recording, all)
          mask: {source: {a: 1}}                | mask.source has the wrong type (found a map, expected a word)
          scale: percents                       | did you mean percent
          scale: ''                             | scale has the wrong type
          alignment: {model: affine}            | alignment.model is none of the words it can be
          alignment: {scope: planes}            | did you mean plane
          alignment: {reference: last}          | alignment.reference is none of the words it can be (found last, expected typical, first or a frame's number from 0)
          alignment: {reference: -1}            | alignment.reference is none of the words it can be
          nuisance: {motion: position}          | nuisance.motion has the wrong type (found position, expected a list)
          nuisance: {motion: [speed]}           | nuisance.motion[1] is none of the words it can be
          nuisance: {motion: [square, square]}  | nuisance.motion holds a word twice (found square)
          responses: {window_s: 3}              | responses.window_s has the wrong type (found 3, expected a list)
          responses: {window_s: [1]}            | responses.window_s needs two numbers (found 1)
          responses: {window_s: [6, 1]}         | responses.window_s is not ascending (found 6, 1)
          responses: {window_s: [a, 1]}         | responses.window_s[1] has the wrong type
          inference: {tail: upper}              | inference.tail is none of the words it can be
          inference: {method: fdr}              | inference.method is none of the words it can be
          noise: {model: arma}                  | noise.model is none of the words it can be
          noise: {df: all}                      | noise.df is none of the words it can be
          regions: {source: atlas}              | regions.source is none of the words it can be
          name: two words                       | the name of the plan breaks the rule for names (found two words
          stimuli: [a]                          | stimuli has the wrong type
          stimuli: {a: skip}                    | stimuli.a has the wrong type (found skip, expected a map of keys)
          stimuli: {a b: {}}                    | the name of a stimulus breaks the rule for names (found a b
          stimuli: {a: {logged_as: b}, b: {}}   | two stimuli are logged as the same trial_type (found a and b as b)
          kernel: {fwhm_s: 59, peak_s: 1}       | no gamma kernel has this peak and width
          kernel: {undershoot_ratio: 0.2}       | only the kernel double_gamma has an undershoot (found kernel.undershoot_ratio)
          kernel: {shape: double_gamma}         | kernel.undershoot_peak_s is missing
          kernel: {shape: square}               | kernel.shape is none of the words it can be
          """)
  void valuesThatMakeNoSenseAreRefused(String rest, String part) {
    String sentence = Plans.refusalWith(rest);
    assertTrue(sentence.startsWith("p.yaml, line 2, column "), sentence);
    assertTrue(sentence.contains(part), sentence);
    assertOneSentence(sentence);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          recording: {frame_interval_s: 0}        | above 0 to 3600
          screening: {z_limit: -1}                | above 0 to 100
          screening: {min_power_deviation: -0.1}  | 0 to 10
          screening: {min_change_ratio: 101}      | 0 to 100
          screening: {window_frames: 1}           | 3 to 9999
          screening: {max_displacement_mm: 0}     | above 0 to 100
          smoothing: {fwhm_mm: -1}                | 0 to 10
          kernel: {peak_s: 0}                     | above 0 to 60
          kernel: {fwhm_s: 61}                    | above 0 to 60
          drift: {cutoff_s: 0}                    | above 0 to 1000000
          noise: {smoothing_mm: 11}               | 0 to 10
          inference: {level: 0}                   | above 0 to 0.5
          inference: {level: 0.6}                 | above 0 to 0.5
          responses: {before_s: 0}                | above 0 to 600
          responses: {after_s: 601}               | above 0 to 600
          responses: {window_s: [-601, 1]}        | -600 to 600
          verdict: {rejected_review: 1.1}         | 0 to 1
          verdict: {rejected_unusable: -0.1}      | 0 to 1
          verdict: {displacement_voxels: 0}       | above 0 to 100
          verdict: {tsnr: -1}                     | 0 to 1000000
          verdict: {trials: -1}                   | 0 to 100000
          verdict: {variance_inflation: 0.5}      | 1 to 1000000
          verdict: {motion_r: 2}                  | 0 to 1
          verdict: {effect_change: -1}            | 0 to 100
          verdict: {sham_p05: [0.1, 2]}           | 0 to 1
          verdict: {sham_p001: 2}                 | 0 to 1
          verdict: {sham_discoveries: 2}          | 0 to 1
          verdict: {coverage: 1.01}               | 0 to 1
          """)
  void valuesOutOfRangeNameTheRange(String rest, String range) {
    String sentence = Plans.refusalWith(rest);
    assertTrue(sentence.contains(" is out of range (found "), sentence);
    assertTrue(sentence.contains(", expected " + range + ")"), sentence);
    assertTrue(sentence.startsWith("p.yaml, line 2, column "), sentence);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          kernel: {shape: finite_impulse, bin_s: 0.4, until_s: 12} | kernel.bin_s: 0.4
          kernel: {shape: finite_impulse}           | kernel.shape: finite_impulse
          kernel: {shape: table}                    | kernel.shape: table
          kernel: {shape: table, file: k.csv}       | kernel.file: k.csv
          stimuli: {a: {modulator: contrast}}       | stimuli.a.modulator: contrast
          nuisance: {components: 5}                 | nuisance.components: 5
          nuisance: {noise_region: white_matter}    | nuisance.noise_region: white_matter
          nuisance: {mask_mean: true}               | nuisance.mask_mean: true
          nuisance: {traces: [pupil]}               | nuisance.traces: a list
          traces: {running_speed: {kernel: true}}   | traces: a map
          noise: {model: ar2}                       | noise.model: ar2
          noise: {model: ar6}                       | noise.model: ar6
          inference: {randomisations: 1000}         | inference.randomisations: 1000
          inference: {statistics: [max_t, tfce]}    | inference.statistics: a list
          inference: {cluster_p: 0.01}              | inference.cluster_p: 0.01
          inference: {seed: 7}                      | inference.seed: 7
          sham_check: {shams: 200}                  | sham_check.shams: 200
          """)
  void whatThisVersionLacksIsRefusedNotIgnored(String rest, String found) {
    String sentence = Plans.refusalWith(rest);
    assertTrue(sentence.contains(": this version does not have "), sentence);
    assertTrue(sentence.contains("(found " + found), sentence);
    assertTrue(sentence.startsWith("p.yaml, line 2, column "), sentence);
    assertOneSentence(sentence);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          name: x                                               | line 1, column 1: the plan has no contrasts
          contrasts: []                                         | line 1, column 12: the plan has no contrasts
          contrasts: {name: a}                                  | contrasts has the wrong type (found a map, expected a list)
          contrasts: [a]                                        | contrasts[1] has the wrong type (found a, expected a map of keys)
          contrasts: [{weights: {a: 1}}]                        | a contrast has no name
          contrasts: [{name: a b, weights: {a: 1}}]             | the name of a contrast breaks the rule for names (found a b
          contrasts: [{name: a}]                                | the contrast a has no weight other than 0
          contrasts: [{name: a, weights: {}}]                   | the contrast a has no weight other than 0
          contrasts: [{name: a, weights: {a: 0, b: 0.0}}]       | the contrast a has no weight other than 0
          contrasts: [{name: a, weights: {a: one}}]             | contrasts[1].weights.a has the wrong type (found one, expected a number)
          contrasts: [{name: a, weights: {a: 1e9}}]             | contrasts[1].weights.a is out of range
          contrasts: [{name: a, weights: [a]}]                  | contrasts[1].weights has the wrong type
          contrasts: [{name: a, any_of: [{a: 1}]}]              | this version does not have F contrasts (found contrasts[1].any_of: a list)
          contrasts: [{name: a, all_of: [b, c]}]                | this version does not have conjunctions (found contrasts[1].all_of: a list)
          contrasts: [{name: a, weights: {a: 1}}, {name: a, weights: {b: 1}}] | column 48: two contrasts have the same name (found a)
          """)
  void contrastsThatSayNothingAreRefused(String text, String part) {
    String sentence = Plans.refusalOf(text);
    assertTrue(sentence.startsWith("p.yaml, line 1, column "), sentence);
    assertTrue(sentence.contains(part), sentence);
    assertOneSentence(sentence);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          contrast: [{name: a, weights: {a: 1}}]   | line 1, column 1: the key is unknown (found contrast,  | contrasts
          contrasts: [{nam: a, weights: {a: 1}}]   | line 1, column 14: the key is unknown (found contrasts[1].nam,  | name
          contrasts: [{name: a, weight: {a: 1}}]   | line 1, column 23: the key is unknown (found contrasts[1].weight,  | weights
          """)
  void aMistypedKeyIsToldRatherThanMissed(String text, String part, String nearest) {
    String sentence = Plans.refusalOf(text);
    assertTrue(sentence.contains(part), sentence);
    assertTrue(sentence.endsWith("; did you mean " + nearest + "."), sentence);
  }

  /** So that no key of the contract is known but not read. */
  @ParameterizedTest
  @ValueSource(
      strings = {
        "name",
        "recording",
        "screening",
        "alignment",
        "smoothing",
        "mask",
        "scale",
        "kernel",
        "stimuli",
        "drift",
        "nuisance",
        "traces",
        "noise",
        "inference",
        "regions",
        "responses",
        "sham_check",
        "verdict",
      })
  void everySectionIsReadForItsValue(String key) {
    String sentence = Plans.refusalWith(key + ": [1, [2]]");
    assertTrue(
        sentence.startsWith("p.yaml, line 2, column " + (key.length() + 3) + ": "), sentence);
    assertFalse(sentence.contains("unknown"), sentence);
  }

  @Test
  void anEndlessTrialTypeThatIsLoggedTwiceIsCutInTheSentence() {
    String name = "x".repeat(100_000);
    String sentence =
        Plans.refusalWith("stimuli: {? " + name + " : ignore, b: {logged_as: " + name + "}}");
    assertTrue(sentence.contains("two stimuli are logged as the same trial_type"), sentence);
    assertTrue(sentence.length() < 600, sentence);
  }

  @Test
  void aCharacterIsNotCutInHalf() {
    String sentence = Plans.refusalWith("name: " + "x".repeat(63) + "\uD83D\uDC3E".repeat(9));
    assertTrue(sentence.contains("(found " + "x".repeat(63) + "..., expected"), sentence);
  }

  @Test
  void anEndlessNameIsCutInTheSentence() {
    String name = "x".repeat(100_000);
    for (String rest :
        new String[] {
          name + ": 1", "mask: {" + name + ": 1}", "mask: {source: " + name + "}", "name: " + name,
        }) {
      assertTrue(Plans.refusalWith("? " + rest.replace(": ", "\n: ")).length() < 600);
      assertTrue(Plans.refusalWith(rest.replace(name, name.substring(0, 1000))).length() < 600);
    }
  }

  private static void assertOneSentence(String sentence) {
    assertTrue(sentence.endsWith("."), sentence);
    assertFalse(sentence.contains("\n"), sentence);
    assertTrue(sentence.contains("; "), "a remedy: " + sentence);
  }
}
