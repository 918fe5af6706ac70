"""Fourcount: what the four counts of a published table say, and what that means for one patient.

Importing the package loads neither Qt nor numpy; ``answer`` and ``read`` are reached on first use.
"""

from __future__ import annotations

from typing import TYPE_CHECKING

if TYPE_CHECKING:
    from fourcount.publish.answer import answer
    from fourcount.publish.read import read

__version__ = "0.3.0"
__all__ = ["__version__", "answer", "read"]


def __getattr__(name: str) -> object:
    if name == "answer":
        from fourcount.publish.answer import answer

        return answer
    if name == "read":
        from fourcount.publish.read import read

        return read
    raise AttributeError(f"module {__name__!r} has no attribute {name!r}")
