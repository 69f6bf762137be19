#pragma once

#include <vector>

#include "fieldtest/tests_of.hpp"
#include "rainledger/fieldtest/law_fits.hpp"
#include "rainledger/losses/horton.hpp"

// Fits of single tests, and tests that follow a law exactly.
namespace rainledger {

inline const std::vector<double> kMinutes{2, 5, 10, 15, 20, 30, 45, 60, 80, 100, 120, 150};

inline LawFit fit_of(const InfiltrationTest& test, FieldLaw law,
                     const LawFitOptions& options = {}) {
    const LawFitAnswer answer = fit_law({&test, 1}, law, options);
    INFO(answer.problem);
    REQUIRE(answer.fit);
    return *answer.fit;
}

template <class Depth>
InfiltrationTest exact_test(const Depth& depth, const std::vector<double>& minutes = kMinutes) {
    std::vector<double> depths;
    for (const double minute : minutes)
        depths.push_back(depth(minute / 60.0));
    return test_of(ReadingKind::infiltrated, minutes, depths);
}

inline InfiltrationTest horton_test(const HortonCurve& curve,
                                    const std::vector<double>& minutes = kMinutes) {
    return exact_test([&](double t) { return horton_cumulative(curve, t); }, minutes);
}

}  // namespace rainledger
