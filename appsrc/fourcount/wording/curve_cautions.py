"""What has to be kept in mind of a curve: the cautions that hold of what it draws."""

from __future__ import annotations

from fourcount.appraisal.findings import OutcomeFindings
from fourcount.appraisal.findings.curve import Curve
from fourcount.wording.cautions import caution_text
from fourcount.wording.curve import View

SAID_BY_THE_CURVE = ("effect-kept-constant", "effect-kept-elsewhere", "difference-kept-constant", "baseline-uncertain")
"""That effects are kept constant, and that a starting risk is taken as certain, the curve's own sentences say."""

OF_THE_COLUMN = ("rests-on-baseline", "other-span")
"""What holds of figures at one starting risk or over another time span, which a curve does not give."""

OF_THE_CARRIED = (
    "constant-rates",
    "within-pairs",
    "adjusted-opposite",
    "adjusted-turned",
    "adjusted-converted",
)
"""What holds of the effect that the patient is told, wherever its line is drawn."""

OF_THE_BAR = ("carried-level",)
"""What holds of the patient's own interval, which the line of that effect alone has beside it."""


def curve_cautions(findings: OutcomeFindings, curve: Curve, view: View) -> tuple[str, ...]:
    """The sentences of the cautions that hold of one view, in their order."""
    left_out = set(SAID_BY_THE_CURVE + OF_THE_COLUMN)
    if view.ratios and not _of_the_carried(curve, view):
        left_out |= set(OF_THE_CARRIED)
    if view.ratios or view.place != curve.carried:
        left_out |= set(OF_THE_BAR)
    return tuple(caution_text(caution) for caution in findings.cautions if caution.key not in left_out)


def _of_the_carried(curve: Curve, view: View) -> bool:
    """Whether the odds ratio that is shown as a risk ratio is the effect that the patient is told."""
    return curve.carried >= 0 and curve.ratios[view.place].effect is curve.lines[curve.carried].effect
