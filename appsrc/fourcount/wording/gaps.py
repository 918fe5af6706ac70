"""Why a figure is not there, and what is wrong with something that was typed: one sentence for every key."""

from __future__ import annotations

from fourcount.record.entry.readings import Mark, Unreadable
from fourcount.stats.results import Gap
from fourcount.wording.facts import told
from fourcount.wording.marks import MARK_TEXTS

__all__ = ["GAP_TEXTS", "LIMIT_TEXTS", "MARK_TEXTS", "gap_text", "limit_text", "mark_text"]

NO_EXACT = (
    "Counts divided by a design effect are not whole, and exact methods take whole counts only; the score family gives "
    "this figure."
)
GAP_TEXTS = {
    # the numbers themselves
    "empty-table": "There is nobody in either group.",
    "empty-index-group": "There is nobody in the index group.",
    "empty-reference-group": "There is nobody in the reference group.",
    "empty-group": "There is nobody in this group.",
    "no-events": "Nobody in either group had the event, so this figure is not determined.",
    "no-non-events": "Everybody in both groups had the event, so this figure is not determined.",
    "zero-width": "An interval of zero width is withheld; the score family gives a real one.",
    "one-outcome": "Nobody, or everybody, here had the event, where textbook odds have no interval; "
    "the score family gives one.",
    "beyond-one": "The risk would pass 100% here.",
    "carried-beyond-zero": "The risk would fall below 0% here.",
    "next-to-certain": "Those without it would have a risk so near 100% that nothing can be told from it.",
    "beyond-zero": "The bare formula’s limit falls below 0%, where no risk lies; the score intervals stay above it.",
    "no-discordant-pairs": "All pairs agree, so their odds ratio is not determined: only pairs that differ tell.",
    "concordant-pairs-unknown": "Only the pairs that differ were typed: without those that agree no risk follows.",
    "empty-pairs": "There is no pair.",
    "no-time": "A group has no person-time, so it has no rate.",
    "no-strata": "No stratum has people in both groups and people with and without the event, so none can be pooled.",
    "one-stratum": "Only one stratum has something to compare, so there is nothing for it to agree with.",
    "fragility-not-below": "Fisher’s p is not below 0.05 in this table, so there is nothing to turn.",
    "fragility-not-reached": "No change of outcomes in the group with fewer events brings Fisher’s p to 0.05.",
    "icc-out-of-range": "An intracluster correlation lies from 0 to 1.",
    "not-positive": "A ratio and its limits have to be above 0.",
    "limits-disordered": "The lower limit lies above the upper one, or the estimate outside both; check the print.",
    "zero-count": "One of the two counts compared is 0, where the bare formula has no interval; "
    "the score family gives one.",
    "cluster-below-one": "A cluster holds one person at least.",
    "not-whole": NO_EXACT,
    "too-few-left": "Divided by the design effect, no more than one person is left, so nothing can be told.",
    "ratio-below-one": "The group exposed fared better, so there is no share of events that the exposure explains.",
    "ratio-above-one": "The group exposed fared worse, so there is no share of events that the exposure prevents.",
    "no-reference-events": "Nobody in the reference group had the event, where the bare formula has no interval.",
    "prevalence-out-of-range": "The share of people exposed lies from 0% to 100%.",
    "margin-out-of-range": "A margin’s difference lies between −100% and 100%, and its ratio above 0.",
    "loss-ratio-out-of-range": "The ratio of risks among the lost is a number from 0 upwards.",
    "no-width": "The limits would fall together, and an interval of zero width is withheld.",
    "endless-log": "An estimate or a limit is 0 or infinite, where its logarithm has no end.",
    "endless-limit": "A limit is infinite, so no standard error follows from it.",
    "p-out-of-range": "A p lies above 0 and goes up to 1.",
    "estimate-at-no-effect": "The estimate is no effect at all, so no interval can be rebuilt from its p.",
    "level-not-printed": "The paper names no level for its limits, so no other level follows from them.",
    # the design, the table, the patient
    "design-needs-pairs": "In this design people come in pairs, and these counts are not of pairs: "
    "unpaired figures are refused. Choose the form of pairs, and type how many pairs differ.",
    "pairs-need-design": "These are counts of pairs; choose a study whose people come in pairs.",
    "design-no-rates": "This design does not follow people over time, so it has no rates.",
    "design-matched": "A matched case-control study sets how many cases and controls it takes and pairs them: "
    "it gives the odds ratio of its pairs and nothing else.",
    "design-before-after": "Before and after, nobody else is compared with: other things change with time too, "
    "so there is no number needed to treat.",
    "events-not-people": "Events were counted, perhaps several in one person: they give no risk of people.",
    "follow-up-varied": "People were followed for different times: raw counts give no number needed to treat. "
    "A printed risk at one time does.",
    "cluster-without-icc": "Whole clusters were assigned, and intervals that take people for independent are too "
    "narrow: an intracluster correlation from 0 to 1 is needed.",
    "cluster-size-missing": "Type the mean size of a cluster: the intracluster correlation alone does not say "
    "how much the intervals widen.",
    "cluster-no-exact": NO_EXACT,
    "effect-unreadable": "The printed effect cannot be read; “0.54 (0.37 to 0.78)” would do.",
    "effect-not-typed": "Type the printed effect with its limits, such as 0.54 (0.37 to 0.78).",
    "no-interval-printed": "The paper gives neither limits nor an exact p to rebuild them from.",
    "not-carried": "This figure cannot be carried to one patient.",
    "rate-difference-not-carried": "A rate difference cannot be turned into a risk here.",
    "no-losses": "Nobody is said to be lost; type how many of each group were.",
    "losses-unreadable": "A number lost, or the ratio of risks among the lost, cannot be read.",
    "clusters-not-here": "Nothing here corrects this figure for clusters, so it is not given.",
    "losses-of-one-group": "Type how many were lost in each of the two groups; one of them is not known.",
    "effect-out-of-range": "A printed ratio cannot be below 0, nor a difference beyond 100 in 100; check the print.",
    "effect-needs-baseline": "Type a starting risk: the paper’s ratio alone does not give one.",
    "difference-needs-baseline": "Type a starting risk: the paper’s difference alone does not give one.",
    "strata-need-baseline": "Each stratum has its own starting risk: type the patient’s.",
    "other-outcome-unknown": "The printed effect says nothing of the other outcome: count the one that it is of.",
    "limits-not-printed": "A risk stands without its limits, so no interval of the difference or the ratio follows.",
    "not-counts": "This form has no four counts.",
    "not-typed": "Type the four counts of the table.",
    "percents-not-typed": "Type the percentage and the total of both groups.",
    "pairs-not-typed": "Type how many pairs differ, either way; those that agree give risks as well.",
    "rates-not-typed": "Type the events and the person-time of both groups.",
    "risks-not-typed": "Type both groups’ risks at one time, with their limits.",
    "strata-not-typed": "Type the four counts of every stratum; a blank row is left out.",
    "unreadable": "A cell of the table cannot be used; the line under the table says why.",
    "follows": "This figure takes a moment and will follow.",
    "design-survey-nnt": "A cross-sectional survey sees who has the event at one time, not who comes to have it, "
    "so it gives no number needed to treat.",
    "design-case-control": "A case-control study sets how many cases and controls it takes, "
    "so its totals give neither risks nor what follows from them.",
    "case-control-needs-baseline": "Type a starting risk from another source: a case-control study has none.",
    "no-starting-risk": "Type a starting risk: nobody is in the reference group to give one.",
    "pairs-need-baseline": "Type a starting risk, or the pairs that agree: those that differ do not give one.",
    "rates-need-baseline": "Type a starting risk, or a rate and the time: person-time itself gives no risk.",
    "rate-not-typed": "Type a rate, such as 12 per 1,000 person-years.",
    "rate-unreadable": "The rate cannot be read; 12 per 1,000 person-years would do.",
    "rate-needs-span": "Type the study’s time span, such as 12 months: a rate gives a risk only over a time.",
    "overall-not-typed": "Type the risk of all people together, and the share of them who are like the index group.",
    "overall-unreadable": "The overall risk, or the share of people who have it, cannot be read; 12% and 30% would do.",
    "span-unreadable": "The other time span cannot be read; 5 years would do.",
    "other-span-needs-study-span": "Type the study’s own time span, such as 12 months: only from it can risks be "
    "carried to another one.",
    "other-span-survey": "A cross-sectional survey looks at one moment, so its risks belong to no time span and cannot "
    "be carried to another one.",
    "other-span-varied": "People were followed for different times, so no other time span follows from raw counts; "
    "a printed risk at one time can be carried.",
    "other-span-pairs": "Over another time span this has no interval: both sides are the same people, and the limits "
    "of the two risks alone do not tell it.",
    "baseline-unreadable": "The starting risk cannot be read; 12% or 12 in 100 would do.",
    "low-above-usual": "The low risk lies above the usual one; check which is which.",
    "high-below-usual": "The high risk lies below the usual one; check which is which.",
    "low-above-high": "The low risk lies above the high one; check which is which.",
    "high-below-low": "The high risk lies below the low one; check which is which.",
    "solved-beyond-one": "With this overall risk and share, the risk of one of the two groups would pass 100%.",
    "solved-beyond-one-odds": "With this overall risk and share, the risk of one of the two groups would pass 100%; "
    "the odds ratio can be carried instead.",
    "solved-beyond-zero": "With this overall risk and share, the risk of one of the two groups would fall below 0%.",
    "solved-beyond-zero-odds": "With this overall risk and share, the risk of one of the two groups would fall below "
    "0%; the odds ratio can be carried instead.",
    "carried-gap": "The effect to be carried has no value in this table, so nothing follows for a patient.",
    "undetermined-at-baseline": "An infinite effect says nothing at a starting risk of 0%, nor an odds ratio of 0 "
    "at one of 100%.",
    "other-level": "The study’s interval of this risk has another level than the effect that is carried.",
    "bare-starting-risk": "The starting risk was typed without an interval of its own.",
    "line-unreadable": "Your line cannot be read; 2 per 100 would do for a difference, 1.25 for a ratio.",
    "line-scale-not-here": "There is no such measure here to draw your line on; choose another scale for it.",
    "formula-beyond-one": "The bare formula’s limit passes 100%, where no risk lies; the score intervals do not.",
    "formula-beyond-risks": "The bare formula’s limit parts the two risks farther than they can lie apart; "
    "the score intervals do not.",
}
LIMIT_TEXTS = {
    "beyond-one": "The upper limit of the risk would pass 100%, so the interval is open there.",
    "carried-beyond-zero": "The lower limit of the risk would fall below 0%, so the interval is open there.",
}
"""What is said where only a limit is withheld and the estimate stands; ``carried`` offers odds where there are any."""

UNKNOWN_GAP = "This figure cannot be given."

UNKNOWN_MARK = "{text}: this cannot be read"


def gap_text(gap: Gap) -> str:
    """One sentence that says why a figure is not given, and what would help where something would."""
    return told(GAP_TEXTS.get(gap.key, UNKNOWN_GAP), gap.facts)


def limit_text(gap: Gap) -> str:
    """The sentence for one limit that is not given beside an estimate that is."""
    return LIMIT_TEXTS.get(gap.key) or gap_text(gap)


def mark_text(mark: Mark | Unreadable) -> str:
    """What was typed, what is wrong with it, and what would do."""
    template = MARK_TEXTS.get(mark.key, UNKNOWN_MARK)
    if not str(mark.facts.get("text", "-")).strip():
        said = told(template.removeprefix("{text}: "), mark.facts)
        return f"{said[:1].upper()}{said[1:]}"
    return told(template, mark.facts)
