package nightjar.report;

import java.util.LinkedHashSet;
import java.util.Set;

/** Collects the publications that a text refers to; numbers follow the order of first mention. */
final class References {
  /** Publications of the methods. */
  enum Published {
    ALLEN(
        "Allen EA, Erhardt EB, Calhoun VD (2012) Data visualization in the neurosciences: overcoming"
            + " the curse of dimensionality. Neuron 74:603-608"),
    BAKER(
        "Baker S, Matthews I (2004) Lucas-Kanade 20 years on: a unifying framework. Int J Comput"
            + " Vis 56:221-255"),
    BENJAMINI_HOCHBERG(
        "Benjamini Y, Hochberg Y (1995) Controlling the false discovery rate: a practical and"
            + " powerful approach to multiple testing. J R Stat Soc B 57:289-300"),
    BENJAMINI_YEKUTIELI(
        "Benjamini Y, Yekutieli D (2001) The control of the false discovery rate in multiple testing"
            + " under dependency. Ann Stat 29:1165-1188"),
    BOYNTON(
        "Boynton GM, Engel SA, Glover GH, Heeger DJ (1996) Linear systems analysis of functional"
            + " magnetic resonance imaging in human V1. J Neurosci 16:4207-4221"),
    DUNN("Dunn OJ (1961) Multiple comparisons among means. J Am Stat Assoc 56:52-64"),
    GLOVER(
        "Glover GH (1999) Deconvolution of impulse response in event-related BOLD fMRI. NeuroImage"
            + " 9:416-429"),
    HOLLAND(
        "Holland PW, Welsch RE (1977) Robust regression using iteratively reweighted least-squares."
            + " Commun Stat Theory Methods 6:813-827"),
    IGLEWICZ(
        "Iglewicz B, Hoaglin DC (1993) How to detect and handle outliers. ASQC Quality Press,"
            + " Milwaukee"),
    KENWARD(
        "Kenward MG, Roger JH (1997) Small sample inference for fixed effects from restricted"
            + " maximum likelihood. Biometrics 53:983-997"),
    LINDQUIST(
        "Lindquist MA, Geuter S, Wager TD, Caffo BS (2019) Modular preprocessing pipelines can"
            + " reintroduce artifacts into fMRI data. Hum Brain Mapp 40:2358-2376"),
    LUCAS(
        "Lucas BD, Kanade T (1981) An iterative image registration technique with an application to"
            + " stereo vision. Proc 7th Int Joint Conf Artif Intell, 674-679"),
    OTSU(
        "Otsu N (1979) A threshold selection method from gray-level histograms. IEEE Trans Syst Man"
            + " Cybern 9:62-66"),
    SATTERTHWAITE(
        "Satterthwaite FE (1946) An approximate distribution of estimates of variance components."
            + " Biometrics Bull 2:110-114"),
    SIDAK(
        "Sidak Z (1967) Rectangular confidence regions for the means of multivariate normal"
            + " distributions. J Am Stat Assoc 62:626-633"),
    WORSLEY(
        "Worsley KJ, Liao CH, Aston J, et al. (2002) A general statistical analysis for fMRI data."
            + " NeuroImage 15:1-15");

    private final String text;

    Published(String text) {
      this.text = text;
    }
  }

  private final Set<Published> mentioned = new LinkedHashSet<>();

  /** Numbers in brackets, e.g. {@code [3]} or {@code [3, 4]}. */
  String cite(Published... works) {
    StringBuilder numbers = new StringBuilder("[");
    for (Published work : works) {
      mentioned.add(work);
      int number = mentioned.stream().toList().indexOf(work) + 1;
      numbers.append(numbers.length() > 1 ? ", " : "").append(number);
    }
    return numbers.append(']').toString();
  }

  /** The numbered list in Markdown. */
  String list() {
    StringBuilder list = new StringBuilder();
    int number = 0;
    for (Published work : mentioned) {
      number++;
      list.append(number).append(". ").append(work.text).append(".\n");
    }
    return list.toString();
  }
}
