"""One title and one plain sentence for every caution, in templates with the facts' names in braces."""

from __future__ import annotations

from fourcount.wording.half_added import GART

PLAIN_ESTIMATE = (
    "The estimate stays as it is; the interval is centred on the altered one and need not hold an estimate of 0 or "
    "infinity."
)
EFFECT_RANGE = "The interval leaves out that {baseline} is itself uncertain."
UNKNOWN = ("Caution", "A caution holds here that this version has no sentence for.")
TEXTS = {
    "read-as": ("How a count was read", "{text} is read as {value}."),
    "percent-disagrees": (
        "A percentage in the print",
        "{text} does not fit {events} of {total}; the count is used.",
    ),
    "percent-several": (
        "A percentage in the print",
        "{text} fits {how_many} counts of {total}; {value}, the nearest, is taken.",
    ),
    "percent-none": (
        "A percentage in the print",
        "{text} fits no count of {total}; {value}, the nearest, is taken.",
    ),
    "index-looks-like-control": (
        "Which group is which",
        "The index group is called “{label}”; if it is the comparison, swap the groups.",
    ),
    "odds-ratio-differs": (
        "Two ratios",
        (
            "The odds ratio {odds_ratio} lies farther from 1 than the {ratio_name} {risk_ratio}: "
            "do not read the one as the other."
        ),
    ),
    "effect-kept-constant": (
        "The same effect elsewhere",
        "The {effect} is assumed to be the same at {baseline} as at the study’s own {study}.",
    ),
    "baseline-far": (
        "A distant starting risk",
        (
            "The starting risk of {baseline} is outside half to twice the study’s own {study}: "
            "the study says less about such people."
        ),
    ),
    "baseline-uncertain": (
        "The starting risk",
        EFFECT_RANGE,
    ),
    "rests-on-baseline": (
        "The starting risk",
        (
            "Every risk, difference and number needed here rests on the starting risk of {baseline}, "
            "which is not from this study, and on the {effect} being the same there."
        ),
    ),
    "totals-are-sampled": (
        "Cases and controls",
        "Totals are those of cases and controls, as many as the study took: no risk follows from them.",
    ),
    "controls-over-time": (
        "How controls were chosen",
        "If controls were sampled as cases arose, the study’s ratio is a rate ratio and must not be converted.",
    ),
    "observational": (
        "Confounding",
        (
            "A {design} does not assign its groups: these are crude figures, and other differences between the groups "
            "may explain them."
        ),
    ),
    "zero-cells": (
        "Zeros",
        "{count} of the four counts is 0: estimates or limits of 0 or infinity are shown as they are.",
    ),
    "half-added": (
        "Half added",
        f"Because of a count of 0, the textbook interval of the {{measure}} is that with {GART}. {PLAIN_ESTIMATE}",
    ),
    "through-no-effect": (
        "No effect is inside the interval",
        "The interval includes no effect: the study is compatible with fewer events and with more.",
    ),
    "family-parts": (
        "Two methods",
        "The p value and an interval disagree about no effect: they rest on different methods.",
    ),
    "rare-harm": (
        "A harm in a trial",
        "With a harm in {risk} of people, one trial’s number of people and time are too small to show it reliably.",
    ),
    "leans": (
        "No effect is inside the interval",
        (
            "The interval at this starting risk includes no effect, and reaches further on the side of “{side}”, "
            "away from the estimate."
        ),
    ),
    "no-control": (
        "Before and after",
        (
            "There is no comparison group: time, other changes and people’s own return to their average may explain "
            "the difference as well."
        ),
    ),
    "abstract-only": (
        "Numbers from the abstract",
        "An abstract may differ from the paper’s own tables, or show the better part of them: check the body.",
    ),
    "cannot-be-checked": (
        "No counts",
        "This effect stands as the paper prints it: without counts nothing here can tell whether it is right.",
    ),
    "interval-rebuilt": (
        "A rebuilt interval",
        "No limits are printed; the interval is rebuilt from {p}, which is approximate.",
    ),
    "printed-level": (
        "The level of the paper",
        "The intervals keep the paper’s own level of {level}; the level of {chosen} chosen here does not change them.",
    ),
    "concordant-unknown": (
        "Only the pairs that differ",
        "Without the pairs that agree there are no risks and no difference: only odds.",
    ),
    "hazard-ratio": (
        "A hazard ratio",
        (
            "The hazard ratio of {value} is a ratio of rates among those still without the event, taken to stay the "
            "same over time; it is no risk ratio, and other events may compete."
        ),
    ),
    "events-counted": (
        "Events, not people",
        "One person may have several events; they resemble each other, so the intervals are too narrow.",
    ),
    "follow-up-varied": (
        "Followed for different times",
        "People were followed for different times, so shares of raw counts are no risks over one time span.",
    ),
    "randomised-differs": (
        "Who was analysed",
        (
            "{label}: {randomised} people were randomised, while {analysed} are in the table and {lost} are said to be "
            "lost; check who was left out."
        ),
    ),
    "losses-overturn": (
        "People lost to follow-up",
        ("Those lost ({lost}) could change whether the interval includes no effect, or its side: {scenarios}."),
    ),
    "cluster-without-icc": ("Clusters", "{reason}"),
    "cluster-corrected": (
        "Clusters",
        (
            "Intervals and p rest on counts divided by the design effect of {design_effect} (intracluster correlation "
            "{icc}, mean size {mean_size}); they depend on that correlation."
        ),
    ),
    "cluster-uncorrected": (
        "Clusters",
        "Nothing here corrects this form for clusters, so it has no intervals and no p.",
    ),
    "strata-part": (
        "Crude and pooled part",
        (
            "The {measure} is {crude} crude and {pooled} within strata: they {apart}, as confounding by the strata can "
            "do."
        ),
    ),
    "strata-odds-ratio-parts": (
        "Crude and pooled part",
        (
            "The odds ratio is {crude} crude and {pooled} pooled, while difference and risk ratio hardly change: an "
            "odds ratio can do so without any confounding. Judge by the difference or the risk ratio."
        ),
    ),
    "strata-unlike": (
        "Strata unlike each other",
        "The strata’s odds ratios differ ({p}): one pooled figure hides that; look at each stratum.",
    ),
    "strata-small": (
        "Small strata",
        (
            "In {small} of {strata} strata fewer than 5 people are expected in a cell: the test of one odds ratio for "
            "all strata says little there, and may find differences that are not there."
        ),
    ),
    "no-meta-analysis": (
        "Strata of one study",
        "This pools the {strata} strata of one study. It is no meta-analysis: several studies differ in more ways.",
    ),
    "effect-kept-elsewhere": (
        "The same effect elsewhere",
        "The {effect} is assumed to be the same at {baseline} as in the study, whose own risk is not known here.",
    ),
    "adjusted-effect": (
        "An adjusted effect",
        "A {design} can adjust only for what it measured{adjusted_for}; what it did not measure may still explain it.",
    ),
    "crude-beside-adjusted": (
        "Crude beside adjusted",
        "The figures of this table are crude; the paper’s own {measure}, adjusted{adjusted_for}, is {value}.",
    ),
    "adjusted-converted": (
        "An adjusted odds ratio",
        "The adjusted odds ratio is converted at {baseline} as if crude; this is approximate.",
    ),
    "difference-kept-constant": (
        "The same difference elsewhere",
        (
            "The difference is assumed to be the same at {baseline} as in the study, whose own risk is not known here; "
            "differences vary with the starting risk more than ratios do."
        ),
    ),
    "constant-rates": (
        "A rate ratio carried",
        "Carrying a rate ratio takes both groups’ rates to stay constant over the time span.",
    ),
    "other-span": (
        "Another time span",
        (
            "Risks over another time span assume that both groups’ hazards go on as in the study: no figure here can "
            "check that."
        ),
    ),
    "solved-from-overall": (
        "A starting risk worked out",
        (
            "The starting risk of {baseline} follows from an overall risk, the share of people who have it and the "
            "{effect}; the first two are taken as certain."
        ),
    ),
    "from-a-rate": (
        "A starting risk from a rate",
        "The starting risk of {baseline} assumes that the rate stays constant over the time span.",
    ),
    "within-pairs": (
        "An odds ratio of pairs",
        (
            "The odds ratio of pairs holds within pairs; at a starting risk averaged over many people it tends to move "
            "the risk too far."
        ),
    ),
    "adjusted-opposite": (
        "Adjusted and crude part",
        (
            "The adjusted {effect} and this table’s own figures point in opposite directions. It is taken as printed "
            "of {first} against {second}: check that."
        ),
    ),
    "adjusted-turned": (
        "The adjusted effect turned",
        (
            "The adjusted {effect} is taken as printed of {first} against {second}, and is turned round here to fit "
            "the groups and the outcome that are counted."
        ),
    ),
    "carried-level": (
        "The level of the paper",
        (
            "The patient’s intervals keep the level of {level} at which the adjusted effect is printed; the level of "
            "{chosen} chosen here does not change them."
        ),
    ),
}
