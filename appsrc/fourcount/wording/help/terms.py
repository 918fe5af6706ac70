"""The words of the window, each with what it means."""

from __future__ import annotations

TERMS = (
    (
        "index group, reference group",
        (
            "The index group had what the study looks at: a treatment or an exposure. The reference group is what it "
            "is compared with: a placebo, usual care, people without the exposure. Swap the groups if they stand the "
            "other way round."
        ),
    ),
    (
        "event counted",
        (
            "The one of the two outcomes that all figures count. It may be welcome or unwelcome. Count the other "
            "outcome to turn every figure to the people who did not have this one."
        ),
    ),
    (
        "difference per 100",
        (
            "Of 100 people in the index group, how many more or fewer had the event than of 100 in the reference "
            "group. It is a difference of two percentages, in percentage points; it is not a percentage of the risk."
        ),
    ),
    (
        "NNTB, NNTH",
        (
            "Number needed to treat for one more person to benefit, or for one to be harmed: one divided by the "
            "difference. It belongs to a comparison, a time span and a starting risk. Here it and its limits are "
            "always rounded up, NNTB and NNTH alike."
        ),
    ),
    (
        "through infinity",
        (
            "Where the interval of the difference holds no effect, a number needed runs from NNTB through infinity to "
            "NNTH: “NNTB 12 to ∞ to NNTH 40” is compatible with one more benefit in 12 people, with no effect at all, "
            "and with one more harm in 40."
        ),
    ),
    (
        "risk ratio",
        (
            "The risk in the index group divided by that in the reference group; 1 is no effect, and 0.54 is a "
            "relative reduction of 46%. By itself it does not say how large the risks are. In a survey it is a "
            "prevalence ratio."
        ),
    ),
    (
        "odds ratio, and as a risk ratio at 12%",
        (
            "Odds are people with the event for each person without it; the odds ratio compares the odds of two "
            "groups. Of counts it lies farther from 1 than the risk ratio, the farther the more common the event. “As "
            "a risk ratio at 12%” says what it comes to where 12 in 100 have the event without the index treatment or "
            "exposure."
        ),
    ),
    (
        "interval, level",
        (
            "All values that the study’s numbers are compatible with at the level chosen. At 95%, intervals made in "
            "this way hold the true value in about 95 of 100 studies, if nothing but the play of small numbers is at "
            "work."
        ),
    ),
    (
        "score intervals",
        (
            "The default: they keep close to their level also with few events and zeros. Difference, ratios and p "
            "never disagree about no effect."
        ),
    ),
    (
        "textbook intervals",
        (
            "The bare formulas that papers usually print, to check a paper’s own figures with. With few events those "
            "of a risk and of a difference are too narrow, and with zeros the ratios need a correction, said beside "
            "them."
        ),
    ),
    (
        "exact intervals",
        (
            "They never fall short of their level, and so are often wider than need be. There is none for a "
            "difference or a risk ratio here: those rows then say “score, approximate”."
        ),
    ),
    (
        "starting risk",
        (
            "How many of 100 people such as this patient have the event without the index treatment or exposure, in "
            "the study’s time span. It is the reference group’s own unless you type one, with its source; the effect "
            "is then assumed to be the same there."
        ),
    ),
    (
        "effect used, kept constant",
        (
            "What the study tells of the effect, taken as the same at the patient’s starting risk: the risk ratio in "
            "a trial, and elsewhere the effect that the paper prints after adjustment, where it is typed. A hazard "
            "ratio, an odds ratio or the difference can be chosen instead. Each gives other figures the farther the "
            "starting risk is from the study’s; only odds, hazards and rates never lead past 100%."
        ),
    ),
    (
        "low, usual, high",
        (
            "Three starting risks side by side, such as those of people with few, some and many causes for the event. "
            "All three are counted among the same number of people."
        ),
    ),
    (
        "an overall risk, the share exposed",
        (
            "A register often tells the risk of everybody, with and without what the index group has. The risk without "
            "it is worked out from that, from the share of people who have it, and from the effect."
        ),
    ),
    (
        "another time span",
        (
            "Risks of the study’s 12 months are carried to 5 years as if the hazard in each group stayed as it was. "
            "Both risks are carried and then compared, since no ratio or difference stays the same by itself."
        ),
    ),
    (
        "what the interval holds",
        (
            "At the study’s own starting risk it is the study’s own interval, unless another effect than that of its "
            "counts is carried, such as an adjusted one. At a starting risk typed with limits or counts it holds the "
            "imprecision of both the starting risk and the effect. At a bare starting risk it holds that of the effect "
            "only."
        ),
    ),
    (
        "the smallest difference that matters, a margin",
        (
            "A line of your own on a measure. The smallest difference that would matter to a patient is drawn, and one "
            "sentence says on which side of it the interval lies. A margin, as a trial of non-inferiority sets it "
            "beforehand, has a one-sided p as well."
        ),
    ),
    (
        "avoided, added, on balance",
        (
            "How many fewer, or more, people in the picture have the event with the index treatment. Only the balance "
            "is known: some may gain while others lose, and nobody can be pointed to."
        ),
    ),
    (
        "pairs that differ, odds ratio of the pairs",
        (
            "A pair is a case with its own control, or one person twice. Pairs that agree say nothing about the "
            "difference; of those that differ, some have the event on the index side only and the others on the "
            "reference side only. The first number divided by the second is the odds ratio of the pairs."
        ),
    ),
    (
        "rate, person-time, rate ratio",
        (
            "Events divided by the time for which people were watched, all their times added up: 38 events in 4,120 "
            "person-years are 9.2 per 1,000 person-years. A rate is not a share of people, since one person may have "
            "several events and be watched for years. The rate ratio is one rate divided by the other."
        ),
    ),
    (
        "hazard ratio",
        (
            "A ratio of rates from moment to moment, among people still without the event. It is not a risk ratio, and "
            "lies farther from 1 than that the more common the event becomes. Counts alone do not give it."
        ),
    ),
    (
        "risk at a time",
        (
            "What a paper prints where people were followed for different times: “9% (6 to 12) at 2 years” allows for "
            "those who left early, which raw counts do not. Intervals here are then built from the printed limits, at "
            "their level."
        ),
    ),
    (
        "strata, pooled, crude",
        (
            "Several tables of one outcome, such as one for each age group. Pooled figures compare the groups within "
            "each stratum; crude ones throw all strata together. Where the two part, what the strata differ in may "
            "confound the crude one. An odds ratio can part so without confounding: judge by the difference or the "
            "risk ratio. Pooling the strata of one study is no meta-analysis of several."
        ),
    ),
    (
        "printed effect, crude or adjusted",
        (
            "An effect that a paper prints without counts, or beside them. An adjusted one comes from the paper’s own "
            "model and cannot be had from counts; it stands apart from the crude one, with what it was adjusted for."
        ),
    ),
    (
        "does it add up",
        (
            "What the paper prints as its result is compared with what its counts give: by every measure, method and "
            "level here, with the groups swapped and the other outcome counted, to the digits printed. “Check” means "
            "that something does not follow; an adjustment or other denominators may explain it."
        ),
    ),
    (
        "people lost, five scenarios",
        (
            "What the table would say if of the people lost to follow-up nobody had the event, everybody, all of one "
            "group and none of the other (the extreme against the result, and the one for it), or so many times as "
            "many as of those followed. No scenario is what happened; together they say how much hangs on the lost."
        ),
    ),
    (
        "fragility",
        (
            "How many people of the group with the lower risk would have to have had the event for Fisher’s p to reach "
            "0.05, beside how many were lost. It hangs on that line, and does not say how large the effect is."
        ),
    ),
    (
        "E-value",
        (
            "How strongly something unmeasured would have to go with both exposure and event, as a risk ratio, to "
            "explain a ratio away. It does not say that there is such a thing."
        ),
    ),
    (
        "attributable fraction, prevented fraction",
        (
            "The share of the events, of the exposed or of everybody, that would not have been without the exposure, "
            "if the whole ratio is caused by it. Where the exposed fare better, the share of the events expected of "
            "them that the exposure prevented."
        ),
    ),
    (
        "clusters, design effect",
        (
            "Where whole wards or practices were assigned, people of one cluster resemble each other, and intervals "
            "that take them for independent are too narrow. The design effect says by how much: the counts behind "
            "intervals and p are divided by it. It follows from the clusters’ mean size and the intracluster "
            "correlation (ICC)."
        ),
    ),
)
"""Each term in the order in which a reader meets it, in two or three plain sentences."""
