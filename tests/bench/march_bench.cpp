#define CATCH_CONFIG_ENABLE_BENCHMARKING
#include <cmath>
#include <string>
#include <utility>
#include <vector>

#include <catch2/catch.hpp>

#include "rainledger/ledger/ledger.hpp"

// Time of one surface's march through a day of 5-minute steps: divide by 288 for the time of a
// step.
namespace rainledger {
namespace {

constexpr int kSteps = 288;

/// A day with one peak: the Green-Ampt soil below is ponded for 9 % of it, Horton's for 12.5 %.
Hyetograph storm_with_a_peak() {
    std::vector<double> edges{0.0};
    std::vector<double> depths;
    for (int i = 0; i < kSteps; ++i) {
        const double t = (i - 120) / 14.0;
        edges.push_back(5.0 * (i + 1));
        depths.push_back(0.05 + 4.0 * std::exp(-t * t));
    }
    return make_hyetograph(std::move(edges), "min", std::move(depths));
}

/// Rain above every capacity all day.
Hyetograph all_ponded() {
    std::vector<double> edges{0.0};
    for (int i = 0; i < kSteps; ++i)
        edges.push_back(5.0 * (i + 1));
    return make_hyetograph(std::move(edges), "min", std::vector<double>(kSteps, 10.0));
}

Surface surface_under(Losses losses) {
    Surface out;
    out.name = "plot";
    out.area_m2 = 1000.0;
    out.losses = std::move(losses);
    return out;
}

}  // namespace

TEST_CASE("march, totals only, 288 steps") {
    const std::vector<std::pair<std::string, Losses>> laws{
        {"Horton", Horton{{50.0, 6.0, 4.14}, 0.0}},
        {"Horton, elapsed time", HortonElapsed{{50.0, 6.0, 4.14}}},
        {"Green-Ampt", GreenAmpt{10.9, 22.0}},
        {"Philip", Philip{12.0, 4.0}},
        {"constant rate", ConstantRate{7.5, 10.0}},
        {"impervious", Impervious{}},
        {"curve number", CurveNumber{80.0}},
    };
    const Hyetograph peak = storm_with_a_peak();
    const Hyetograph ponded = all_ponded();
    for (const auto& [name, losses] : laws) {
        const Surface surface = surface_under(losses);
        BENCHMARK(name + ", storm with a peak") {
            return march_totals(surface, peak).excess_mm;
        };
        BENCHMARK(name + ", all ponded") {
            return march_totals(surface, ponded).excess_mm;
        };
    }
}

TEST_CASE("what the march is measured against, 288 calls") {
    BENCHMARK("exp, one after another") {
        double x = 0.5;
        for (int i = 0; i < kSteps; ++i)
            x = std::exp(-x);
        return x;
    };
    BENCHMARK("log1p, one after another") {
        double x = 0.5;
        for (int i = 0; i < kSteps; ++i)
            x = std::log1p(x);
        return x;
    };
    BENCHMARK("divide, one after another") {
        double x = 1.7;
        for (int i = 0; i < kSteps; ++i)
            x = 2.9 / x;
        return x;
    };
}

TEST_CASE("the whole ledger of four surfaces, 288 steps") {
    Site site{{surface_under(Impervious{}), surface_under(Horton{{50.0, 6.0, 4.14}, 0.0}),
               surface_under(GreenAmpt{10.9, 22.0}), surface_under(CurveNumber{80.0})}};
    for (Surface& surface : site.surfaces)
        surface.name += std::to_string(&surface - &site.surfaces[0]);
    const Hyetograph rain = storm_with_a_peak();
    BENCHMARK("no run-on") {
        return keep_ledger(site, rain).site.total.excess_mm;
    };
    site.surfaces[0].runs_onto = {{2, 1.0}};
    BENCHMARK("a roof runs onto Green-Ampt") {
        return keep_ledger(site, rain).site.total.excess_mm;
    };
    site.surfaces[1].runs_onto = {{2, 1.0}};
    BENCHMARK("and a lawn does as well") {
        return keep_ledger(site, rain).site.total.excess_mm;
    };
}

}  // namespace rainledger
