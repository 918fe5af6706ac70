"""Files of records for the tests, and one thing in them changed."""

from __future__ import annotations

import copy
import json
from collections.abc import Callable
from pathlib import Path
from typing import Any

FILES = Path(__file__).parent / "record" / "files"
EVERYTHING = FILES / "format-1-everything.fourcount"
"""Every form of print and every field, none of them as it begins."""

LEAST = FILES / "format-1-least.fourcount"
TREE = json.loads(EVERYTHING.read_bytes())

Tree = dict[str, Any]


def put(*path: Any) -> Callable[[Tree], None]:
    """Put the last of the arguments to the place that the others name."""
    *places, last, value = path

    def change(tree: Tree) -> None:
        held: Any = tree
        for place in places:
            held = held[place]
        held[last] = value

    return change


def file_with(change: Callable[[Tree], None]) -> bytes:
    """The bytes of a whole file with one change in it."""
    tree = copy.deepcopy(TREE)
    change(tree)
    return json.dumps(tree).encode()
