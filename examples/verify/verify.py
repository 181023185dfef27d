"""Checks the signature of a record with nothing but the published key set. Python's standard library alone.
    python3 verify.py signature.json jwks.json        (either may be an https address)
signature.json is the answer of GET /api/v1/traverses/{id}/signature. Ed25519 as RFC 8032, section 5.1, has it.
"""
import base64, hashlib, json, sys, urllib.request

P = 2**255 - 19
ORDER = 2**252 + 27742317777372353535851937790883648493
D = -121665 * pow(121666, P - 2, P) % P
SQRT_MINUS_1 = pow(2, (P - 1) // 4, P)

def add(a, b):
    (x1, y1, z1, t1), (x2, y2, z2, t2) = a, b
    e, f, g, h = (y1 - x1) * (y2 - x2), (y1 + x1) * (y2 + x2), 2 * t1 * t2 * D, 2 * z1 * z2
    e, f, g, h = f - e, h - g, h + g, f + e
    return e * f % P, g * h % P, f * g % P, e * h % P

def times(scalar, point):
    total = (0, 1, 1, 0)
    while scalar:
        if scalar & 1:
            total = add(total, point)
        point, scalar = add(point, point), scalar >> 1
    return total

def point(data):
    y = int.from_bytes(data, "little")
    sign, y = y >> 255, y & (2**255 - 1)
    square = (y * y - 1) * pow(D * y * y + 1, P - 2, P) % P
    x = pow(square, (P + 3) // 8, P)
    x = x if x * x % P == square else x * SQRT_MINUS_1 % P
    if y >= P or x * x % P != square or (x == 0 and sign):
        raise ValueError("not a point of the curve")
    x = P - x if x & 1 != sign else x
    return x, y, 1, x * y % P

BASE = point((4 * pow(5, P - 2, P) % P).to_bytes(32, "little"))

def verifies(key, message, signature):
    s = int.from_bytes(signature[32:], "little")
    if len(signature) != 64 or s >= ORDER:
        return False
    h = int.from_bytes(hashlib.sha512(signature[:32] + key + message).digest(), "little") % ORDER
    left, right = times(s, BASE), add(point(signature[:32]), times(h, point(key)))
    return (left[0] * right[2] - right[0] * left[2]) % P == 0 and (left[1] * right[2] - right[1] * left[2]) % P == 0

def unpack(text): return base64.urlsafe_b64decode(text + "=" * (-len(text) % 4))
def read(place): return json.load(urllib.request.urlopen(place) if place.startswith("http") else open(place, encoding="utf-8"))

record, keys = read(sys.argv[1]), read(sys.argv[2])["keys"]
header, payload, signature = record["jws"].split(".")
claimed = json.loads(unpack(header))
key = next((k for k in keys if k["kid"] == claimed.get("kid") and k.get("crv") == "Ed25519"), None)
signed = header + "." + base64.urlsafe_b64encode(record["document"].encode()).decode().rstrip("=")
holds = payload == "" and claimed.get("alg") == "EdDSA" and key is not None and verifies(unpack(key["x"]), signed.encode(), unpack(signature))
print("The signature holds." if holds else "THE SIGNATURE DOES NOT HOLD: this is not the document that was signed.")
sys.exit(0 if holds else 1)
