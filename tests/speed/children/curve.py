"""How long the curve takes, and for how long the window stands still meanwhile.

curve.py FOLDER: the seconds from the command to the first drawing on screen, the longest time for which the window's
loop was held up until then, and the median seconds of later drawings with their words, after the pause in typing.
"""

from __future__ import annotations

import json
import statistics
import sys
import time
from pathlib import Path

import fourcount.face.running_start  # noqa: F401 - as the command starts
from fourcount.face.application import make_application, make_window
from fourcount.face.later import Later
from fourcount.wording.example import worked_example

LATER = 12


class Held:
    """The longest gap between two turns of the loop."""

    def __init__(self) -> None:
        self.most, self._last = 0.0, time.perf_counter()

    def turn(self) -> None:
        now = time.perf_counter()
        self.most, self._last = max(self.most, now - self._last), now


def main() -> None:
    application, later = make_application(["fourcount"]), Later()
    window = make_window(Path(sys.argv[1]), worked_example(), later)
    window.numbers_ready.connect(application.quit)
    window.show()
    application.exec()

    from fourcount.face.curve_window import CurveWindow, open_curve

    def turn_until_drawn(shown: CurveWindow, held: Held) -> None:
        while shown._pause.isActive() or shown._asked is None or not shown.drawn:
            application.processEvents()
            held.turn()
            time.sleep(0.0005)

    held, start = Held(), time.perf_counter()
    shown = open_curve(window)
    held.turn()
    opening = held.most
    turn_until_drawn(shown, held)
    first, times = time.perf_counter() - start, []
    for place in range(LATER):
        window.session.edit_text("starting_risk_text", f"{place + 3}%")
        shown._pause.stop()
        start = time.perf_counter()
        shown._show_state()
        turn_until_drawn(shown, Held())
        times.append(time.perf_counter() - start)
    print(json.dumps({"first": first, "opening": opening, "held": held.most, "later": statistics.median(times)}))
    shown.close()
    window.session.record = worked_example()
    window.close()
    later.finish(60.0)


if __name__ == "__main__":
    main()
