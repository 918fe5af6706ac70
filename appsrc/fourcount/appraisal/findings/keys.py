"""The keys of measures, form by form, and of the reasons for which a figure is withheld."""

from __future__ import annotations

from fourcount.record.outcome import PAPER_MEASURES

MEASURES = (
    "risk_index",
    "risk_reference",
    "odds_index",
    "odds_reference",
    "risk_difference",
    "number_needed",
    "risk_ratio",
    "other_risk_ratio",
    "odds_ratio",
)
"""The keys of ``OutcomeFindings.measures``; ``other_risk_ratio`` is the ratio of not having the event."""

PAIR_MEASURES = (
    "pair_risk_index",
    "pair_risk_reference",
    "pair_difference",
    "number_needed",
    "pair_ratio",
    "pair_odds_ratio",
)
"""The measures of the form ``pairs``."""

RATE_MEASURES = ("rate_index", "rate_reference", "rate_difference", "rate_ratio")
"""The measures of the form ``person-time``: events a unit of person-time."""

TIMED_MEASURES = ("risk_index", "risk_reference", "risk_difference", "number_needed", "risk_ratio")
"""The measures of the form ``risk-at-time``."""

EFFECT_MEASURES = PAPER_MEASURES
"""The form ``effect-only`` has exactly one of these, with the method "printed"."""

POOLED_MEASURES = ("pooled_risk_difference", "pooled_risk_ratio", "pooled_odds_ratio")
"""What the form ``strata`` adds to ``MEASURES``, which then are those of all strata thrown together ("crude")."""

GAP_KEYS = (
    "design-needs-pairs",  # a matched or paired design, and a table that is not of pairs
    "pairs-need-design",  # a table of pairs in a design whose people are not paired
    "design-no-rates",  # a survey or a case-control study has no person-time
    "design-matched",  # a matched case-control study gives its conditional odds ratio and nothing else
    "design-before-after",  # no number needed where the same people are looked at before and after
    "events-not-people",  # events were counted, several in one person perhaps: they give no risk
    "follow-up-varied",  # people were followed for different times: raw counts give no number needed
    "cluster-without-icc",  # clusters, and no intracluster correlation: no interval and no p
    "cluster-size-missing",  # an intracluster correlation without the clusters' mean size
    "cluster-no-exact",  # counts divided by a design effect are not whole: exact methods do not take them
    "effect-unreadable",  # the printed effect cannot be read
    "effect-not-typed",  # no printed effect yet
    "no-interval-printed",  # the printed effect has no limits, and no p to rebuild them from
    "not-carried",  # nothing here says how a patient's risk would change
    "rate-difference-not-carried",  # no risk follows from a difference of rates
    "no-losses",  # nobody is said to be lost
    "losses-unreadable",  # the number lost, or the ratio of risks among them, cannot be read
    "limits-not-printed",  # a risk without its limits: no interval of the difference
    "clusters-not-here",  # this form, or this figure, has no correction for clusters
    "losses-of-one-group",  # how many were lost is known in one group only, or in none
    "effect-out-of-range",  # a printed ratio below 0, or a printed difference beyond 100 in 100
    "effect-needs-baseline",  # a printed effect alone holds no starting risk
    "difference-needs-baseline",  # nor does a printed difference
    "strata-need-baseline",  # strata have a starting risk each, and none in common
    "other-outcome-unknown",  # this printed effect says nothing of the other outcome
    "not-counts",  # this form has no four counts
    "not-typed",  # not all four counts are there yet
    "percents-not-typed",  # nor all percentages with their totals
    "pairs-not-typed",  # nor the pairs that differ
    "rates-not-typed",  # nor events and person-time of both groups
    "risks-not-typed",  # nor both groups' risks at one time
    "strata-not-typed",  # nor the four counts of every stratum
    "unreadable",  # a cell holds text that gives no count
    "follows",  # the figure takes a moment and is computed apart
    "design-survey-nnt",  # a cross-sectional survey has no number needed to treat
    "design-case-control",  # a case-control study gives no risk: its totals are those of cases and controls
    "case-control-needs-baseline",  # without an outside starting risk a case-control study says nothing of a patient
    "no-starting-risk",  # nothing typed, and the reference group has nobody
    "pairs-need-baseline",  # pairs that differ alone hold no starting risk
    "rates-need-baseline",  # a rate is no risk until a time is set
    "rate-not-typed",  # the starting risk is to come from a rate, and none is typed
    "rate-unreadable",  # or it cannot be read
    "rate-needs-span",  # a rate gives a risk over a time, and no time span is known
    "overall-not-typed",  # the starting risk is to be solved from an overall risk, and a part is missing
    "overall-unreadable",  # or a part cannot be read
    "span-unreadable",  # the other time span gives no time
    "other-span-needs-study-span",  # another time span, and the study's own is not known as a time
    "other-span-survey",  # a survey looks at one moment
    "other-span-varied",  # people were followed for different times, so their risks belong to none
    "other-span-pairs",  # of the same people, no interval follows from those of two risks
    "baseline-unreadable",  # the typed starting risk gives no risk
    "low-above-usual",  # of three starting risks the low one lies above the usual one
    "high-below-usual",  # or the high one below it
    "low-above-high",  # or, without a usual one, the low one above the high one
    "high-below-low",  # which is the same of the high one
    "solved-beyond-one",  # no starting risk up to 100% gives the overall risk under this effect
    "solved-beyond-one-odds",  # the same where an odds ratio could be carried, which never does so
    "solved-beyond-zero",  # no starting risk from 0% gives it
    "solved-beyond-zero-odds",  # the same where an odds ratio could be carried
    "carried-gap",  # the effect to carry has no value
    "other-level",  # the study's own starting risk has an interval of another level than the effect carried to it
    "bare-starting-risk",  # the starting risk is a bare value without an interval of its own
    "line-unreadable",  # the reader's own line cannot be read
    "line-scale-not-here",  # this form has no measure on the scale of the reader's own line
    "formula-beyond-one",  # a limit of the bare textbook formula passes 100%, where no risk of a patient lies
    "formula-beyond-risks",  # a limit of the bare textbook formula parts two risks farther than they can lie apart
)
"""Every reason this folder gives for withholding a figure, beside those of ``stats.results.GAP_KEYS``."""
