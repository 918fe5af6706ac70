"""Which figures are left for later, so that typing never waits."""

from __future__ import annotations

import sys

from fourcount.record.paper import Choices
from fourcount.stats.methods import slow
from fourcount.stats.results import Counts

NEED_NUMPY = frozenset({"clopper-pearson", "conditional-exact", "fisher"})
"""The keys of the exact family's methods that load numpy and scipy.special on their first use."""

GROW_WITH_SIZE = frozenset({"conditional-exact", "fisher"})
"""Those whose work grows with the counts."""

NOTHING: frozenset[str] = frozenset()


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
