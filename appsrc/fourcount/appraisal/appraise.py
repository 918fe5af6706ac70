"""From one outcome and the record's choices to all that follows from it."""

from __future__ import annotations

from collections.abc import Callable
from functools import lru_cache

from fourcount.appraisal.findings import OutcomeFindings
from fourcount.appraisal.forms.four_counts import appraise_counts
from fourcount.appraisal.postponing import AT_LEISURE, Pace, may_wait, numbers_loaded
from fourcount.record.outcome import COUNTED_FORMS, Form, Outcome, form_of
from fourcount.record.paper import Choices

REMEMBERED = 512
"""How many answers are kept: more than the outcomes of the largest record, and some of its past."""

WayIn = Callable[[Outcome, Choices, Pace], OutcomeFindings]


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
    form = form_of(outcome.table)
    way_in = appraise_counts if form in COUNTED_FORMS else _other_form(form)
    return way_in(outcome, choices, pace)


def _other_form(form: Form) -> WayIn:
    """The way in of a form that is not four counts, loaded with its first use: the window starts without."""
    if form == "effect-only":
        from fourcount.appraisal.forms.effect_only import appraise_effect

        return appraise_effect
    if form == "pairs":
        from fourcount.appraisal.forms.pairs import appraise_pairs

        return appraise_pairs
    if form == "person-time":
        from fourcount.appraisal.forms.person_time import appraise_rates

        return appraise_rates
    if form == "risk-at-time":
        from fourcount.appraisal.forms.risk_at_time import appraise_timed

        return appraise_timed
    from fourcount.appraisal.forms.strata import appraise_strata

    return appraise_strata
