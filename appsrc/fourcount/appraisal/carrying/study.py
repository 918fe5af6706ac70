"""What one form gives of a study for a patient."""

from __future__ import annotations

import msgspec

from fourcount.appraisal.findings import Carriable, Figure, Gap
from fourcount.record.outcome import Outcome


class OwnRisks(msgspec.Struct, frozen=True, kw_only=True):
    """Both groups' risks, with their difference and ratio, each with the study's direct interval at one level.

    ``related`` says that both sides are the same people, so that no interval follows from those of the two risks.
    """

    index: Figure
    reference: Figure
    difference: Figure
    ratio: Figure
    level: float
    related: bool = False


class Study(msgspec.Struct, frozen=True, kw_only=True):
    """One outcome's effects and risks, and what its design refuses.

    ``own`` is None where the form or the design has no risks of people; ``needs`` is then the key of the reason why a
    starting risk has to be typed. ``odds_ratio`` is the one that is seen as a risk ratio as well, ``no_conversion``
    why there is none. ``number_needed`` is the reason for which the patient has none, ``refused`` the one for which
    nothing is carried at all, if any, and ``nothing`` the one where no effect is carriable.
    """

    outcome: Outcome
    carriable: tuple[Carriable, ...]
    own: OwnRisks | None = None
    needs: str = "effect-needs-baseline"
    odds_ratio: Carriable | None = None
    no_conversion: Gap = Gap("not-counts")
    nothing: Gap = Gap("not-carried")
    number_needed: str | None = None
    refused: Gap | None = None
