"""How a picture is asked for; everything has a default that suits a first look."""

from __future__ import annotations

from typing import Literal, NamedTuple

Icons = Literal["person", "block", "dot"]
ICONS: tuple[Icons, ...] = ("person", "block", "dot")

Arrangement = Literal["two", "one", "bars"]
ARRANGEMENTS: tuple[Arrangement, ...] = ("two", "one", "bars")


class PictureOptions(NamedTuple):
    """What the reader chose to see.

    ``arrangement`` is two arrays, one array with all three states, or a bar pair. ``uncertainty`` draws the interval
    of the risk with, off at first: for patients it is not known to help. ``relative`` asks for the picture of the
    relative figure after the absolute one. ``captions`` are left out for a page that sets its own.
    """

    icons: Icons = "person"
    arrangement: Arrangement = "two"
    uncertainty: bool = False
    relative: bool = False
    captions: bool = True


USUAL = PictureOptions()
