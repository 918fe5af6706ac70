"""The number of a file's format, and one step from each older format to the next.

A change of what a file holds, were it one new field, is a new format: an older program then says that the file is
newer, where it would otherwise lose the field when it saves. To make one: raise ``FORMAT``, and put the step into
``STEPS`` that makes a tree of the format before into one of the new format. A step meets whatever a file holds: what is
not as it should be it leaves as it is, for the types to refuse. Steps never change afterwards, and a file of every
format stays in the tests.
"""

from __future__ import annotations

from collections.abc import Callable, Mapping
from types import MappingProxyType
from typing import Any

from fourcount.record.file.refused import Refused

Tree = dict[str, Any]
Steps = Mapping[int, Callable[[Tree], Tree]]

FORMAT = 1
FORMAT_KEY = "fourcount_format"
"""The first key of every file, by which it is known for one of ours."""

STEPS: Steps = MappingProxyType({})
"""By the number of a format: what makes a tree of that format one of the next."""


def upgraded(tree: Tree, steps: Steps = STEPS, newest: int = FORMAT) -> Tree | Refused:
    """The fields of a file in the newest format, without its number."""
    number = tree.get(FORMAT_KEY)
    if not isinstance(number, int) or isinstance(number, bool) or number < 1:
        return Refused("not-a-record")
    if number > newest:
        return Refused("newer", {"number": min(number, 10**9), "newest": newest})
    fields = {key: value for key, value in tree.items() if key != FORMAT_KEY}
    for older in range(number, newest):
        fields = steps[older](fields)
    return fields
