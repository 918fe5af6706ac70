"""What to keep in mind: one plain sentence for every caution, beside the block that always stands."""

from __future__ import annotations

from collections.abc import Mapping

from fourcount.appraisal.findings import Caution, Fact, Gap
from fourcount.wording import limits, numbers
from fourcount.wording.caution_texts import PLAIN_ESTIMATE, TEXTS
from fourcount.wording.facts import quoted, told
from fourcount.wording.gaps import gap_text
from fourcount.wording.half_added import WALTER
from fourcount.wording.standing import STANDING, STANDING_FULL

__all__ = [
    "PLAIN_ESTIMATE",
    "SAID_OF_THE_PATIENT",
    "STANDING",
    "STANDING_FULL",
    "TEXTS",
    "caution_text",
    "caution_title",
]

HALF_ADDED_TO_A_RATIO = (
    f"Because of a count of 0, the textbook interval of the {{measure}} is that with {WALTER}. {PLAIN_ESTIMATE}"
)
RATIO_KEPT_CONSTANT = (
    "The {effect} is assumed to be the same at {baseline} as at the study’s own {study}; keeping the {effect} of not "
    "having the event constant instead would give other figures."
)
DIFFERENCE_KEPT_CONSTANT = (
    "The difference is assumed to be the same at {baseline} as at the study’s own {study}; differences vary with the "
    "starting risk more than ratios do."
)
CRUDE_BESIDE_ADJUSTED = (
    "The {effect} carried to {baseline} is the crude one; the paper’s adjusted effect can be carried instead."
)
HAZARD_RATIO_CARRIED = (
    "The hazard ratio of {value} is a ratio of rates among those still without the event, and no risk ratio. Carrying "
    "it takes it to stay the same over the whole time span, and leaves out other events that compete."
)
SAID_OF_THE_PATIENT = ("baseline-uncertain",)
"""The cautions that the patient's own words say already, wherever both stand together."""

MATCHED = (
    "The pairs are alike in what they were matched for; other differences between cases and controls may explain the "
    "odds ratio."
)
OVER_STRATA = {
    "observational": (
        "A {design} does not assign its groups: pooling deals with what the strata differ in and with nothing else, "
        "and the crude figures not even with that. Other differences between the groups may explain them."
    ),
    "crude-carried": "The {effect} carried to {baseline} is pooled over the strata and adjusted for nothing else.",
    "crude-beside-adjusted": (
        "The figures of this table are crude, or pooled over its strata and no more; the paper’s own {measure}, "
        "adjusted{adjusted_for}, is {value}."
    ),
}
"""What is said instead where the table is one of several strata."""

SCENARIOS = {
    "none": "if none of them had the event",
    "all": "if all of them had it",
    "worst": "in the extreme against the result",
    "best": "in the extreme for the result",
    "ratio": "at the ratio that was typed",
}
ADJUSTED_FOR = {"adjusted-effect": ", here {what}", "crude-beside-adjusted": " for {what}"}
PRINT_UNITS = {"percent": "%", "per-1000": " per 1,000"}
FIRST_AND_SECOND = {"first": "the first group", "second": "the second"}
UNNAMED = {"index": "Index group", "reference": "Reference group"}
UNKNOWN = ("Caution", "A caution holds here that this version has no sentence for.")
OPPOSITE = "point in opposite directions"
A_TENTH = "differ by more than a tenth"
SEVERAL_ZEROS = "{count} of the four counts are 0: estimates or limits of 0 or infinity are shown as they are."


def caution_text(caution: Caution) -> str:
    """The caution as one plain sentence with its numbers in it."""
    return told(_template(caution), caution.facts, _said(caution))


def _template(caution: Caution) -> str:
    """The sentence of a caution, which for some keys depends on the facts."""
    key, facts = caution.key, caution.facts
    if key == "zero-cells" and facts.get("count", 1) != 1:
        return SEVERAL_ZEROS
    if key == "half-added" and facts.get("measure") == "risk_ratio":
        return HALF_ADDED_TO_A_RATIO
    if key == "effect-kept-constant" and facts.get("effect") == "risk_ratio":
        return RATIO_KEPT_CONSTANT
    if key == "difference-kept-constant" and "study" in facts:
        return DIFFERENCE_KEPT_CONSTANT
    if key == "hazard-ratio" and "carried" in facts:
        return HAZARD_RATIO_CARRIED
    if key == "crude-carried" and "beside" in facts:
        return CRUDE_BESIDE_ADJUSTED
    if key == "observational" and facts.get("design") == "matched":
        return MATCHED
    if "strata" in facts and key in OVER_STRATA:
        return OVER_STRATA[key]
    return TEXTS.get(key, UNKNOWN)[1]


def caution_title(caution: Caution) -> str:
    """What the caution is about, in a few words."""
    return TEXTS.get(caution.key, UNKNOWN)[0]


def _said(caution: Caution) -> dict[str, str]:
    """Facts whose words depend on the caution, or on another fact, rather than on their own name."""
    facts = caution.facts
    said: dict[str, str] = {}
    if facts.get("start") == "reference" and isinstance(facts.get("baseline"), float):
        said["baseline"] = numbers.percent(float(facts["baseline"]))
    if "reason" in facts:
        said["reason"] = gap_text(Gap(str(facts["reason"])))
    if "counts" in facts:
        said["how_many"] = numbers.whole(len(str(facts["counts"]).split(", ")))
    if "scenarios" in facts:
        keys = str(facts["scenarios"]).split(", ")
        said["scenarios"] = "; ".join(SCENARIOS.get(key, key) for key in keys)
    if "adjusted_for" in facts:
        what = quoted(str(facts["adjusted_for"]))
        said["adjusted_for"] = ADJUSTED_FOR[caution.key].format(what=what) if what else ""
    if caution.key in ("adjusted-opposite", "adjusted-turned"):
        said |= {name: _label(facts, name, stand_in) for name, stand_in in FIRST_AND_SECOND.items()}
    said |= _said_of_a_print(caution)
    if "crude" in facts and "pooled" in facts:
        said["apart"] = OPPOSITE if _opposite(facts) else A_TENTH
    for name in ("crude", "pooled"):
        if name in facts and facts.get("measure") == "risk_difference":
            said[name] = _per_100(facts[name])
    return said


def _said_of_a_print(caution: Caution) -> dict[str, str]:
    """A group of a trial's report, and an effect with the digits and the unit of its print."""
    facts = caution.facts
    said: dict[str, str] = {}
    if caution.key == "randomised-differs" and not str(facts.get("label", "")).strip():
        said["label"] = UNNAMED[str(facts.get("group", ""))] if facts.get("group") in UNNAMED else "One group"
    if caution.key == "crude-beside-adjusted":
        digits = str(facts.get("value", "")).replace("-", numbers.MINUS)
        said["value"] = f"{digits}{PRINT_UNITS.get(str(facts.get('print_unit')), '')}"
    return said


def _label(facts: Mapping[str, Fact], name: str, stand_in: str) -> str:
    """A group's label in quotation marks."""
    return f"“{quoted(str(facts[name]))}”" if name in facts else stand_in


def _opposite(facts: Mapping[str, Fact]) -> bool:
    """Whether crude and pooled lie on different sides of no effect."""
    none = 0.0 if facts.get("measure") == "risk_difference" else 1.0
    crude, pooled = facts["crude"], facts["pooled"]
    if isinstance(crude, str) or isinstance(pooled, str):
        return False
    return (crude > none > pooled) or (crude < none < pooled)


def _per_100(difference: Fact) -> str:
    if isinstance(difference, str):
        return difference
    return f"{numbers.hundred(difference)} {limits.side(difference)} per 100" if difference else "0.0 per 100"
