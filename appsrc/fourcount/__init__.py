"""Fourcount: what the four counts of a published table say, and what that means for one patient.

Importing the package loads neither Qt nor numpy; ``answer`` is reached on first use.
"""

from __future__ import annotations

from typing import TYPE_CHECKING

if TYPE_CHECKING:
    from fourcount.publish.answer import answer

__version__ = "0.1.0"
__all__ = ["__version__", "answer"]


def __getattr__(name: str) -> object:
    if name == "answer":
        from fourcount.publish.answer import answer

        return answer
    raise AttributeError(f"module {__name__!r} has no attribute {name!r}")
