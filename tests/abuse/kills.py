"""Kills in the middle of saving and setting aside: the file is the record before or the one after, and never a half.

    python tests/abuse/kills.py [1000]

Each round forks a child that has two records in turns, sets them aside and, in every other round, saves them too, as a
window does. It is killed (SIGKILL) at a moment at random after it has done so once. Then the file is read, and what is
set aside is looked for as the next start does: a file must be there and whole, and so must what is set aside where
nothing was saved. The totals are printed; the exit status is 1 if anything was lost or half. Only systems that can
fork run it.
"""

from __future__ import annotations

import os
import random
import signal
import sys
import tempfile
import time
from collections import Counter
from pathlib import Path

from PySide6.QtCore import QCoreApplication

from fourcount.face.keeping import Keeping
from fourcount.face.session import Document, Session
from fourcount.face.set_aside import SetAside
from fourcount.publish.files import read_file
from fourcount.record import editing
from fourcount.record.codec import encode
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Record
from fourcount.wording.example import worked_example

LONGEST = 0.02
"""Seconds that a child lives at most: some ten rounds of saving."""

OUTCOMES = 60
"""Enough that a file takes more than one write."""


def records() -> tuple[Record, Record]:
    """A short record and a long one, so that half of one could not pass for the other."""
    short = worked_example()
    long = short
    for _ in range(OUTCOMES):
        long = editing.add_outcome(long, 0)
    return short, editing.edit_record_text(long, "title_text", "A long record " * 100)


def work(folder: Path, both: tuple[Record, Record], saves: bool, done: int) -> None:
    """Set aside, and save or not, until the end comes; ``done`` is told after the first time."""
    path = folder / "paper.fourcount"
    keeping_for = Session(both[0])
    keeping, aside = Keeping(keeping_for, keeping_for), SetAside(keeping_for, folder / "aside", True, keeping_for)
    for turn in range(1_000_000):
        keeping_for.change_record(both[turn % 2], 0)
        keeping_for.document = Document(Record(outcomes=(Outcome(),) * 2), path)
        aside.keep()
        if saves and keeping.save(path, over=True).reason:
            break
        if turn == 0:
            os.write(done, b"1")


def killed(folder: Path, both: tuple[Record, Record], saves: bool, seconds: float) -> None:
    """One child, ended so many seconds after it has first done what it does."""
    told, done = os.pipe()
    child = os.fork()
    if child == 0:
        try:
            work(folder, both, saves, done)
        finally:
            os._exit(3)
    os.close(done)
    os.read(told, 1)
    os.close(told)
    time.sleep(seconds)
    os.kill(child, signal.SIGKILL)
    _, status = os.waitpid(child, 0)
    if not os.WIFSIGNALED(status):
        raise RuntimeError(f"a child ended by itself: {status}")


def looked_at(folder: Path, both: tuple[Record, Record], saves: bool) -> list[str]:
    """What is found after a kill, in words: of the file, and of what was set aside."""
    path, found = folder / "paper.fourcount", []
    if saves:
        found.append("file lost" if not path.exists() else "file whole" if read_file(path) in both else "file half")
    session = Session()
    orphans = SetAside(session, folder / "aside", True, session).orphans()
    if not orphans and not saves:
        found.append("set aside lost")
    for orphan in orphans:
        found.append("set aside whole" if orphan.found in both else "set aside half")
        orphan.delete()
    return found


def kills(rounds: int, seed: int = 20_261) -> Counter[str]:
    """So many kills, each looked at; how often each thing was found."""
    both, chance, counts = records(), random.Random(seed), Counter[str]()
    with tempfile.TemporaryDirectory(prefix="fourcount-kills-") as place:
        folder = Path(place)
        for turn in range(rounds):
            saves = turn % 2 == 0
            killed(folder, both, saves, chance.uniform(0.0, LONGEST))
            counts.update(looked_at(folder, both, saves))
            counts["kills while saving" if saves else "kills while setting aside"] += 1
        counts["half-written files beside it"] = sum(
            1 for path in folder.rglob("*") if path.is_file() and path.suffix not in (".fourcount", ".aside", ".lock")
        )
    return counts


BAD = ("file lost", "file half", "set aside lost", "set aside half")


def main() -> int:
    """The totals on the screen."""
    assert all(isinstance(encode(record), bytes) for record in records())
    application, began = QCoreApplication([]), time.monotonic()
    counts = kills(int(sys.argv[1]) if len(sys.argv) > 1 else 1_000)
    for what, number in sorted(counts.items()):
        print(f"{what:32} {number:8,}")
    print(f"{time.monotonic() - began:.1f} s")
    del application
    return 1 if any(counts[what] for what in BAD) else 0


if __name__ == "__main__":
    sys.exit(main())
