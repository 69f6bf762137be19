#include "ledger/parts.hpp"

#include <cmath>
#include <vector>

#include "test.hpp"

namespace rainledger {
namespace {

struct Cut {
    std::vector<double> lengths;
    double coarsest = 0.0;
};

/// Cuts [0, length] for a rate given as a function of time.
template <class Rate>
Cut cut(double length, double allowed, const Rate& rate) {
    Cut out;
    double at = 0.0;
    out.coarsest = for_each_part(
        length, allowed, [&](double h) { return rate(at + h); },
        [&](double h) {
            out.lengths.push_back(h);
            at += h;
        });
    return out;
}

}  // namespace

TEST_CASE("parts keep a varying rate within what is allowed, and no finer than needed") {
    const auto rate = [](double t) { return 10.0 * std::exp(-3.0 * t); };
    const Cut parts = cut(0.25, 1e-7, rate);
    double at = 0.0;
    for (const double h : parts.lengths) {
        CHECK(std::abs(rate(at + h) - rate(at)) * h / 4.0 <= 1e-7);
        at += h;
    }
    CHECK_THAT(at, WithinAbs(0.25, 1e-14));
    CHECK(parts.coarsest <= 1e-7);
    CHECK(parts.lengths.size() > 1500);
    CHECK(parts.lengths.size() < 6000);
    CHECK(parts.lengths.front() < parts.lengths.back());  // finest where the rate changes most
}

TEST_CASE("a constant rate stays whole and a jump costs a few parts") {
    CHECK(cut(1.0, 1e-9, [](double) { return 4.0; }).lengths.size() == 1);
    const Cut jump = cut(1.0, 1e-9, [](double t) { return t < 0.3 ? 4.0 : 9.0; });
    CHECK(jump.lengths.size() < 60);
    CHECK(jump.coarsest <= 1e-9);
}

TEST_CASE("parts of a varying rate last a second at most") {
    const Cut parts = cut(1.0, 1e-3, [](double t) { return 10.0 * t; });
    for (const double h : parts.lengths)
        CHECK(h <= 1.0 / 3600.0);
    CHECK(parts.lengths.size() == 4096);
}

TEST_CASE("where the halvings run out, it is told by how much") {
    const Cut coarse = cut(1.0, 1e-12, [](double t) { return 100.0 * t; });
    CHECK(coarse.lengths.size() == 16384);
    CHECK_THAT(coarse.coarsest, WithinRel(100.0 / 4.0 / 16384.0 / 16384.0, 1e-6));
}

}  // namespace rainledger
