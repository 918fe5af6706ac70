"""What one outcome says across starting risks: each effect kept constant."""

from __future__ import annotations

import msgspec

from fourcount.appraisal.findings.patient import Carriable, Rank
from fourcount.stats.results import Gap


class CurvePoint(msgspec.Struct, frozen=True, kw_only=True):
    """What the effect comes to at one starting risk; each value can be a ``Gap`` by itself."""

    start: float
    value: float | Gap
    low: float | Gap
    high: float | Gap


class CurveLine(msgspec.Struct, frozen=True, kw_only=True):
    """One effect kept constant: the risk with, or the risk ratio, at each starting risk, in order.

    The points hold the starting risks at which the estimate or a limit reaches 0 or 100%. ``first`` and ``last`` are
    the lowest and the highest starting risk at which the estimate gives a risk: 0 and 1 where it does everywhere.
    """

    effect: Carriable
    points: tuple[CurvePoint, ...]
    first: float
    last: float


class CurveMark(msgspec.Struct, frozen=True, kw_only=True):
    """A point that the graph names: the study's own two risks, a patient's starting risk and what follows, or both.

    A patient's mark lies on the line of the effect that is carried, at the study's own time span; ``low`` and ``high``
    are the limits of the risk with that the patient is told, where they are of that span.
    """

    of_study: bool
    of_patient: bool
    rank: Rank
    without: float
    with_: float | Gap
    low: float | Gap
    high: float | Gap


class Curve(msgspec.Struct, frozen=True, kw_only=True):
    """Every effect that can be carried, as the risk with across starting risks, and odds ratios as risk ratios.

    ``lines`` stand in the order of ``carriable``, ``ratios`` are those of the odds ratios. ``left_out`` are the effects
    that give no line. ``carried`` is the place in ``lines`` of the effect that the patient is told, -1 where that
    one has no line. ``reach`` is the highest starting risk shown.
    """

    lines: tuple[CurveLine, ...]
    ratios: tuple[CurveLine, ...]
    marks: tuple[CurveMark, ...]
    left_out: tuple[Carriable, ...]
    carried: int
    reach: float
