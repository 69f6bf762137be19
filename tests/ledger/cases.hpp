#pragma once

#include <random>
#include <vector>

#include "rainledger/ledger/ledger.hpp"

// Random storms and surfaces for property tests, and the small storms that tests share.
namespace rainledger::testing {

/// A storm of steps of `step_min` minutes.
Hyetograph storm_of(double step_min, std::vector<double> depths_mm);

/// Draws plausible and, now and then, degenerate cases from one seed.
class Cases {
public:
    explicit Cases(unsigned seed) : engine_(seed) {}

    /// Bursts, bells and irregular steps, with dry gaps.
    Hyetograph storm();
    /// One of every law, with and without interception, storage and held water.
    Surface surface();
    /// Infiltration laws only: no curve number, no phi index.
    Surface infiltrating_surface();
    double between(double low, double high);
    bool one_in(int n);

private:
    Losses losses(int kind);

    std::mt19937_64 engine_;
};

Site site_of(Surface surface);

}  // namespace rainledger::testing
