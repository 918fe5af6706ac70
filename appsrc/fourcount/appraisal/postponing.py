"""Which figures are left for later, so that typing never waits."""

from __future__ import annotations

import sys
from dataclasses import dataclass

from fourcount.record.outcome import Outcome, Pairs
from fourcount.record.paper import Choices
from fourcount.stats.methods import slow
from fourcount.stats.results import Counts

NEED_NUMPY = frozenset({"clopper-pearson", "conditional-exact", "fisher"})
"""The keys of the exact family's methods that load numpy and scipy.special on their first use."""

PAIRS_NEED_NUMPY = frozenset(
    {"clopper-pearson", "conditional-exact", "conditional-mid-p", "mcnemar-exact", "mcnemar-mid-p"}
)
"""The same of pairs; two of them belong to the default family."""

RATES_NEED_NUMPY = frozenset({"exact", "binomial-exact"})
"""The same of person-time."""

GROW_WITH_SIZE = frozenset({"conditional-exact", "fisher"})
"""Those whose work grows with the counts."""

NOTHING: frozenset[str] = frozenset()


@dataclass(frozen=True, slots=True)
class Pace:
    """Whether a keystroke waits for the answer, and whether numpy and scipy.special are loaded."""

    deferring: bool = False
    loaded: bool = True

    @property
    def without_numpy(self) -> bool:
        """Whether nothing may be computed that would load numpy now."""
        return self.deferring and not self.loaded


AT_LEISURE = Pace()


def may_wait(outcome: Outcome, choices: Choices) -> bool:
    """Whether any figure of this outcome could make a keystroke wait: the exact family, pairs, and fragility."""
    return choices.family == "exact" or isinstance(outcome.table, Pairs) or outcome.design == "trial"


def numbers_loaded() -> bool:
    """Whether numpy and scipy.special are loaded to the end.

    A module stands in ``sys.modules`` from the start of its import; whoever used it then would wait for it.
    """
    return all(_loaded(name) for name in ("numpy", "scipy.special"))


def _loaded(name: str) -> bool:
    module = sys.modules.get(name)
    return module is not None and not getattr(module.__spec__, "_initializing", False)


def postponed(counts: Counts, choices: Choices, loaded: bool) -> frozenset[str]:
    """The keys of the methods of the chosen family that would make a keystroke wait."""
    if choices.family != "exact":
        return NOTHING
    if not loaded:
        return NEED_NUMPY
    return GROW_WITH_SIZE if slow(counts, choices.family) else NOTHING
