"""What each study design supports, in one table."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass, field
from types import MappingProxyType

from fourcount.record.outcome import Design, Effect

_NO_RISK = MappingProxyType(
    dict.fromkeys(
        (
            "risk_index",
            "risk_reference",
            "odds_index",
            "odds_reference",
            "risk_difference",
            "number_needed",
            "risk_ratio",
            "other_risk_ratio",
        ),
        "design-case-control",
    )
)


@dataclass(frozen=True, kw_only=True, slots=True)
class Support:
    """What one design supports.

    ``withheld`` maps a measure to the key of the reason for which it is not given. ``carries`` lists the
    effects that may be carried to a patient. ``own_starting_risk`` says whether the reference group's risk
    is a risk of people at all. ``patient_number_needed`` is the reason for which the patient has none, if any.
    """

    withheld: Mapping[str, str] = field(default_factory=lambda: MappingProxyType({}))
    carries: tuple[Effect, ...] = ("risk_ratio", "odds_ratio")
    own_starting_risk: bool = True
    patient_number_needed: str | None = None

    def effect(self, chosen: Effect) -> Effect:
        """The effect to carry: the chosen one where this design has it, else the one it has."""
        return chosen if chosen in self.carries else self.carries[0]


SUPPORT: Mapping[Design, Support] = MappingProxyType(
    {
        "trial": Support(),
        "cohort": Support(),
        # A prevalence at one moment has no time in which one more person could benefit.
        "survey": Support(
            withheld=MappingProxyType({"number_needed": "design-survey-nnt"}), patient_number_needed="design-survey-nnt"
        ),
        # The investigator chose how many cases and controls there are: only the odds ratio does not depend on
        # that (Cornfield 1951, from memory), so no risk ratio of this table can be carried either.
        "case-control": Support(withheld=_NO_RISK, carries=("odds_ratio",), own_starting_risk=False),
    }
)
