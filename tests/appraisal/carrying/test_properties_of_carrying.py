"""What holds of a patient's figures whatever is printed, chosen and typed."""

from __future__ import annotations

import math
from typing import Any

import msgspec
from hypothesis import given
from hypothesis import strategies as st

from forms import EVERY_FORM
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import GAP_KEYS, Figure, Gap, Interval, PatientFindings
from fourcount.record.outcome import DESIGNS, EFFECTS, START_KINDS, Patient
from fourcount.record.paper import FAMILIES, Choices
from fourcount.stats.results import GAP_KEYS as STATS_GAP_KEYS

ROUNDING = 1e-9
RISKS = st.sampled_from(
    ["", "0%", "100%", "12%", "12% (9 to 15)", "24 of 200", "0 of 50", "50 of 50", "120%", "x", "99.9%", "0.01%"]
)
PATIENTS = st.builds(
    Patient,
    starting_risk_text=RISKS,
    low_risk_text=RISKS,
    high_risk_text=RISKS,
    overall_risk_text=RISKS,
    exposed_share_text=st.sampled_from(["", "0%", "30%", "100%"]),
    rate_text=st.sampled_from(["", "0 per year", "12 per 1,000 person-years", "3 per month", "x"]),
    other_span_text=st.sampled_from(["", "5 years", "1 day", "x", "100 years"]),
    effect=st.sampled_from(EFFECTS),
    start_kind=st.sampled_from(START_KINDS),
)


def figures(patient: PatientFindings) -> tuple[Figure, ...]:
    return patient.without, patient.with_, patient.difference, patient.risk_ratio


def check(patient: PatientFindings | Gap | None) -> None:
    """One starting risk, and the low and the high one with it."""
    if patient is None:
        return
    if isinstance(patient, Gap):
        assert patient.key in (*GAP_KEYS, *STATS_GAP_KEYS)
        return
    for figure in figures(patient):
        low, high = getattr(figure.interval, "low", 0.0), getattr(figure.interval, "high", 0.0)
        assert not any(math.isnan(value) for value in (figure.estimate, low, high) if not isinstance(value, Gap))
        if isinstance(figure.interval, Interval):
            assert low <= high
            if not isinstance(figure.estimate, Gap) and figure.interval.adjusted is None:
                assert low - ROUNDING <= figure.estimate <= high + ROUNDING
    for risk in (patient.without, patient.with_):
        assert isinstance(risk.estimate, Gap) or 0 <= risk.estimate <= 1
        assert (
            not isinstance(risk.interval, Interval)
            or -ROUNDING <= risk.interval.low <= risk.interval.high <= 1 + ROUNDING
        )
    without, with_, difference = patient.without.estimate, patient.with_.estimate, patient.difference.estimate
    if not (isinstance(without, Gap) or isinstance(with_, Gap) or isinstance(difference, Gap)):
        assert math.isclose(difference, with_ - without, abs_tol=ROUNDING)
    check(patient.low)
    check(patient.high)


@given(
    form=st.sampled_from(sorted(EVERY_FORM)),
    patient=PATIENTS,
    family=st.sampled_from(FAMILIES),
    fields=st.fixed_dictionaries(
        {
            "span_text": st.sampled_from(["12 months", "", "some time"]),
            "index_group": st.sampled_from(["first", "second"]),
            "counted": st.sampled_from(["left", "right"]),
            "adjusted_text": st.sampled_from(["", "OR 0.4 (0.2 to 0.7)", "HR 2", "RD -5% (-8 to -2)", "RR 0 (0 to 0)"]),
        },
        optional={"design": st.sampled_from(DESIGNS), "follow_up_varied": st.booleans()},
    ),
)
def test_no_patient_is_impossible(form: str, patient: Patient, family: Any, fields: dict[str, Any]) -> None:
    """Risks lie from 0 to 1, what parts them is their difference, estimates lie in their limits, and nothing is nan."""
    outcome = msgspec.structs.replace(EVERY_FORM[form], patient=patient, **fields)
    check(appraise(outcome, Choices(family=family)).patient)


@given(form=st.sampled_from(sorted(EVERY_FORM)), patient=PATIENTS, design=st.sampled_from(DESIGNS))
def test_swapped_groups_keep_what_can_be_carried(form: str, patient: Patient, design: Any) -> None:
    """The same effects turned round: each ratio is the other one's reciprocal, each difference has the other sign."""
    outcome = msgspec.structs.replace(EVERY_FORM[form], patient=patient, design=design)
    one = appraise(outcome, Choices()).carriable
    other = appraise(msgspec.structs.replace(outcome, index_group="second"), Choices()).carriable
    assert [(mine.effect, mine.adjusted) for mine in one] == [(theirs.effect, theirs.adjusted) for theirs in other]
    for mine, theirs in zip(one, other, strict=True):
        here, there = mine.figure.estimate, theirs.figure.estimate
        assert not isinstance(here, Gap)
        assert not isinstance(there, Gap)
        turned = -here if mine.effect == "risk_difference" else 1 / here
        assert math.isclose(turned, there, rel_tol=ROUNDING)
