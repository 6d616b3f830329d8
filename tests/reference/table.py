"""The comparison: one row for each number, and how it is printed."""

from dataclasses import dataclass

import numpy as np

from materials import Array


@dataclass
class Row:
    """A number of the engine's and the same from outside; `difference` and `allowed` are relative."""

    case: str
    quantity: str
    engine: float
    outside: float
    difference: float
    allowed: float

    @property
    def passed(self) -> bool:
        """What is not a number has failed."""
        return bool(self.difference <= self.allowed)


def compare(case: str, quantity: str, engine: Array | float, outside: Array | float, allowed: float) -> Row:
    """
    One row for a number, or for numbers of one kind: every entry along the first axis is measured by its own largest
    number, and the worst of them is shown.
    """
    # What the engine could not answer arrives as none and becomes not-a-number.
    ours, theirs = np.atleast_1d(np.asarray(engine, float)), np.atleast_1d(np.asarray(outside, float))
    if ours.shape != theirs.shape:
        raise ValueError(f"{case}, {quantity}: {ours.shape} against {theirs.shape} numbers")
    entries = (len(theirs), -1)
    ours, theirs = ours.reshape(entries), theirs.reshape(entries)
    size = np.abs(theirs).max(axis=1, keepdims=True)
    off = np.abs(ours - theirs) / np.where(size > 0, size, 1)
    at = np.unravel_index(np.argmax(np.where(np.isnan(off), np.inf, off)), off.shape)
    return Row(case, quantity, float(ours[at]), float(theirs[at]), float(off[at]), allowed)


def print_rows(rows: list[Row]) -> None:
    """Prints the table; a row beyond its allowance is marked."""
    wide = max(len(row.case) for row in rows)
    what = max(len(row.quantity) for row in rows)
    head = ("case", "quantity", "engine", "outside", "difference", "allowed")
    print(f"{head[0]:{wide}}  {head[1]:{what}}  {head[2]:>13}  {head[3]:>13}  {head[4]:>10}  {head[5]:>7}")
    for row in rows:
        numbers = f"{row.engine:13.6e}  {row.outside:13.6e}  {row.difference:10.1e}  {row.allowed:7.0e}"
        print(f"{row.case:{wide}}  {row.quantity:{what}}  {numbers}{'' if row.passed else '  FAILED'}")
