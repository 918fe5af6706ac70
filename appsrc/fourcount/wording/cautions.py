"""What to keep in mind: one plain sentence for every caution, beside the block that always stands."""

from __future__ import annotations

from collections.abc import Mapping

from fourcount.appraisal.findings import Caution, Fact, Gap
from fourcount.wording import limits, numbers
from fourcount.wording.caution_texts import PLAIN_ESTIMATE, TEXTS, UNKNOWN
from fourcount.wording.caution_variants import template
from fourcount.wording.facts import quoted, told
from fourcount.wording.gaps import gap_text
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

SAID_OF_THE_PATIENT = ("baseline-uncertain",)
"""The cautions that the patient's own words say already, wherever both stand together."""

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
AS_A_RISK = ("other", "becomes")
OPPOSITE = "point in opposite directions"
A_TENTH = "differ by more than a tenth"


def caution_text(caution: Caution) -> str:
    """The caution as one plain sentence with its numbers in it."""
    return told(template(caution), caution.facts, _said(caution))


def caution_title(caution: Caution) -> str:
    """What the caution is about, in a few words."""
    return TEXTS.get(caution.key, UNKNOWN)[0]


def _said(caution: Caution) -> dict[str, str]:
    """Facts whose words depend on the caution, or on another fact, rather than on their own name."""
    facts = caution.facts
    said = _said_of_carrying(facts)
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


def _said_of_carrying(facts: Mapping[str, Fact]) -> dict[str, str]:
    """Risks that were worked out have the digits of computed ones; an adjusted effect is called so."""
    names = (*AS_A_RISK, "baseline") if "start" in facts else AS_A_RISK
    said = {name: numbers.percent(risk) for name in names if isinstance(risk := facts.get(name), float)}
    return {**said, "effect": told("adjusted {effect}", facts)} if "adjusted" in facts else said


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
