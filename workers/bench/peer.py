"""The Python side of the benchmark: numpy vectorised, and numerical inverse kinematics by PyKDL.

First line on standard input: {"arm", "postures", "targets", "starts", "warm"}; answers {"has": [...]}. Then one job name a line; answers
{"seconds", "done", "of"}. Targets are 4 × 4 poses, `starts` eight postures to start from for all of them, `warm` one near start each.
"""

import json
import sys
import time

try:
    import numpy as np
except ImportError:
    np = None
try:
    import PyKDL
except ImportError:
    PyKDL = None


def analyse_by_numpy(data):
    """Forward kinematics, Jacobian and both sets of singular values of all postures at once; standard rows."""
    arm = data["arm"]
    q = np.array(data["postures"])
    count = len(q)
    speeds = np.array([joint["maxSpeed"] for joint in arm["joints"]])
    start = time.perf_counter()
    frame = np.tile(np.eye(4), (count, 1, 1))
    axes, origins = [], []
    for i, joint in enumerate(arm["joints"]):
        axes.append(frame[:, :3, 2].copy())
        origins.append(frame[:, :3, 3].copy())
        theta = joint["theta"] + q[:, i]
        c, s = np.cos(theta), np.sin(theta)
        ca, sa = np.cos(joint["alpha"]), np.sin(joint["alpha"])
        step = np.zeros((count, 4, 4))
        step[:, 0, 0], step[:, 0, 1], step[:, 0, 2], step[:, 0, 3] = c, -s * ca, s * sa, joint["a"] * c
        step[:, 1, 0], step[:, 1, 1], step[:, 1, 2], step[:, 1, 3] = s, c * ca, -c * sa, joint["a"] * s
        step[:, 2, 1], step[:, 2, 2], step[:, 2, 3], step[:, 3, 3] = sa, ca, joint["d"], 1
        frame = frame @ step
    tool = frame[:, :3, 3] + frame[:, :3, :3] @ np.array(data["arm"]["tool"]["xyz"])
    linear = np.stack([np.cross(z, tool - p) for z, p in zip(axes, origins)], axis=2) * speeds
    angular = np.stack(axes, axis=2) * speeds * data["lengthM"]
    np.linalg.svd(linear, compute_uv=False)
    np.linalg.svd(np.concatenate([linear, angular], axis=1), compute_uv=False)
    return {"seconds": time.perf_counter() - start, "done": count, "of": count}


class Kdl:
    def __init__(self, data):
        arm = data["arm"]
        self.chain = PyKDL.Chain()
        for joint in arm["joints"]:
            frame = PyKDL.Frame.DH(joint["a"], joint["alpha"], joint["d"], joint["theta"])
            self.chain.addSegment(PyKDL.Segment(PyKDL.Joint(PyKDL.Joint.RotZ), frame))
        fixed = getattr(PyKDL.Joint, "Fixed", None)
        if fixed is None:
            fixed = getattr(PyKDL.Joint, "None")
        self.chain.addSegment(PyKDL.Segment(PyKDL.Joint(fixed), PyKDL.Frame(PyKDL.Vector(*arm["tool"]["xyz"]))))
        self.forward = PyKDL.ChainFkSolverPos_recursive(self.chain)
        self.solver = PyKDL.ChainIkSolverPos_LMA(self.chain, 1e-10, 200)
        self.targets = [self.frame(rows) for rows in data["targets"]]
        self.starts = [self.array(values) for values in data["starts"]]
        self.warm = [self.array(values) for values in data["warm"]]

    @staticmethod
    def frame(rows):
        rotation = PyKDL.Rotation(*[rows[i][j] for i in range(3) for j in range(3)])
        return PyKDL.Frame(rotation, PyKDL.Vector(*[rows[i][3] for i in range(3)]))

    @staticmethod
    def array(values):
        out = PyKDL.JntArray(len(values))
        for i, value in enumerate(values):
            out[i] = value
        return out

    def run(self, starts_of):
        """Limits are not asked for: any posture that arrives counts, which favours this side."""
        out = PyKDL.JntArray(self.chain.getNrOfJoints())
        solve = self.solver.CartToJnt
        done = 0
        start = time.perf_counter()
        for index, target in enumerate(self.targets):
            found = False
            for guess in starts_of(index):
                if solve(guess, target, out) >= 0:
                    found = True
            done += found
        return {"seconds": time.perf_counter() - start, "done": done, "of": len(self.targets)}


def main():
    data = json.loads(sys.stdin.readline())
    jobs = {}
    if np is not None:
        jobs["numpy"] = lambda: analyse_by_numpy(data)
    if PyKDL is not None:
        kdl = Kdl(data)
        jobs["kdl starts"] = lambda: kdl.run(lambda index: kdl.starts)
        jobs["kdl warm"] = lambda: kdl.run(lambda index: (kdl.warm[index],))
    print(json.dumps({"has": list(jobs)}), flush=True)
    for line in sys.stdin:
        print(json.dumps(jobs[json.loads(line)]()), flush=True)


main()
