"""From one outcome and the record's choices to all that follows from it."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from functools import lru_cache
from types import MappingProxyType

from fourcount.appraisal.findings import OutcomeFindings
from fourcount.appraisal.forms.effect_only import appraise_effect
from fourcount.appraisal.forms.four_counts import appraise_counts
from fourcount.appraisal.forms.pairs import appraise_pairs
from fourcount.appraisal.forms.person_time import appraise_rates
from fourcount.appraisal.forms.risk_at_time import appraise_timed
from fourcount.appraisal.forms.strata import appraise_strata
from fourcount.appraisal.postponing import AT_LEISURE, Pace, may_wait, numbers_loaded
from fourcount.record.outcome import Form, Outcome, form_of
from fourcount.record.paper import Choices

REMEMBERED = 512
"""How many answers are kept: more than the outcomes of the largest record, and some of its past."""

_BY_FORM: Mapping[Form, Callable[[Outcome, Choices, Pace], OutcomeFindings]] = MappingProxyType(
    {
        "events-and-others": appraise_counts,
        "events-of-total": appraise_counts,
        "percent-of-total": appraise_counts,
        "effect-only": appraise_effect,
        "pairs": appraise_pairs,
        "person-time": appraise_rates,
        "risk-at-time": appraise_timed,
        "strata": appraise_strata,
    }
)


def appraise(outcome: Outcome, choices: Choices, deferring: bool = False) -> OutcomeFindings:
    """All that one outcome says under the record's choices.

    The answer is remembered for equal arguments. With ``deferring`` a figure that would make a keystroke
    wait is the Gap "follows" (a slow one, or one that needs numpy and scipy.special while these are not
    loaded yet); the caller asks again without it, away from the keyboard.
    """
    waits = deferring and may_wait(outcome, choices)
    return _appraise(outcome, choices, Pace(waits, numbers_loaded()) if waits else AT_LEISURE)


@lru_cache(maxsize=REMEMBERED)
def _appraise(outcome: Outcome, choices: Choices, pace: Pace) -> OutcomeFindings:
    return _BY_FORM[form_of(outcome.table)](outcome, choices, pace)
