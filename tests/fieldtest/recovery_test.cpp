#include <cmath>
#include <cstdint>
#include <iostream>
#include <random>
#include <string>

#include "fieldtest/tests_of.hpp"
#include "rainledger/fieldtest/law_fits.hpp"
#include "rainledger/losses/green_ampt.hpp"
#include "rainledger/losses/horton.hpp"
#include "rainledger/losses/philip.hpp"

// Synthetic tests with known parameters and seeded errors: the 95 % intervals must hold the truth
// in 93 to 97 % of them. At a tenth of the count chance alone moves the share by more, and the
// bounds are four standard deviations of a binomial share.
namespace rainledger {
namespace {

#ifdef RAINLEDGER_FEW_CASES
constexpr int kCases = 300;
#else
constexpr int kCases = 3000;
#endif
constexpr double kChance = 0.95;

const std::vector<double> kMinutes{2, 4, 6, 9, 12, 16, 20, 25, 30, 40, 50, 60, 75, 90, 120, 150};

/// Numbers of our own making from the generator's bits, the same with every standard library.
class Chance {
public:
    explicit Chance(std::uint64_t seed) : bits_(seed) {}

    double uniform(double low, double high) {
        constexpr double kPerBit = 0x1.0p-53;
        return low + (high - low) * (static_cast<double>(bits_() >> 11U) + 0.5) * kPerBit;
    }
    double normal() {
        const double radius = std::sqrt(-2.0 * std::log(uniform(0.0, 1.0)));
        return radius * std::cos(2.0 * 3.14159265358979323846 * uniform(0.0, 1.0));
    }

private:
    std::mt19937_64 bits_;
};

/// The truth of a case: parameters in the order of LawFit, and their cumulative depth.
struct Truth {
    std::vector<double> parameters;
    double (*depth)(const std::vector<double>&, double time_h);
};

Truth draw(FieldLaw law, Chance& chance) {
    switch (law) {
        case FieldLaw::horton:
            return {
                {chance.uniform(80.0, 200.0), chance.uniform(10.0, 40.0), chance.uniform(2.0, 5.0)},
                [](const std::vector<double>& p, double t) {
                    return horton_cumulative({p[0], p[1], p[2]}, t);
                }};
        case FieldLaw::green_ampt:
            return {{chance.uniform(8.0, 20.0), chance.uniform(20.0, 80.0)},
                    [](const std::vector<double>& p, double t) {
                        return green_ampt_cumulative(p[0], p[1], t);
                    }};
        case FieldLaw::philip:
            return {{chance.uniform(15.0, 50.0), chance.uniform(5.0, 20.0)},
                    [](const std::vector<double>& p, double t) {
                        return philip_cumulative(p[0], p[1], t);
                    }};
        case FieldLaw::kostiakov:
            return {
                {chance.uniform(20.0, 60.0), chance.uniform(0.4, 0.8)},
                [](const std::vector<double>& p, double t) { return p[0] * std::pow(t, p[1]); }};
        case FieldLaw::modified_kostiakov:
            break;
    }
    return {
        {chance.uniform(20.0, 40.0), chance.uniform(0.35, 0.55), chance.uniform(10.0, 25.0)},
        [](const std::vector<double>& p, double t) { return p[0] * std::pow(t, p[1]) + p[2] * t; }};
}

/// The truth read with errors: on each cumulative depth, or on each drop.
InfiltrationTest read(const Truth& truth, ReadingKind kind, double error_mm, Chance& chance) {
    InfiltrationTest test;
    test.kind = kind;
    double before_h = 0.0;
    double before_mm = 0.0;
    double depth_mm = 0.0;
    for (const double minute : kMinutes) {
        const double end_h = minute / 60.0;
        const double exact_mm = truth.depth(truth.parameters, end_h);
        const double error = error_mm * chance.normal();
        TestReading reading;
        reading.start_h = before_h;
        reading.end_h = end_h;
        reading.middle_h = 0.5 * (before_h + end_h);
        if (errors_add_up(kind)) {
            reading.interval_mm = exact_mm - before_mm + error;
            reading.depth_mm = depth_mm + reading.interval_mm;
        } else {
            reading.depth_mm = exact_mm + error;
            reading.interval_mm = reading.depth_mm - depth_mm;
        }
        reading.rate_mm_per_h = reading.interval_mm / (end_h - before_h);
        test.readings.push_back(reading);
        before_h = end_h;
        before_mm = exact_mm;
        depth_mm = reading.depth_mm;
    }
    return test;
}

void check_recovery(FieldLaw law, ReadingKind kind, double error_mm) {
    Chance chance(20261201);
    std::vector<int> held(3, 0);
    std::size_t parameters = 0;
    int without = 0;
    for (int i = 0; i < kCases; ++i) {
        const Truth truth = draw(law, chance);
        const InfiltrationTest test = read(truth, kind, error_mm, chance);
        const LawFitAnswer answer = fit_law({&test, 1}, law);
        REQUIRE(answer.fit);
        parameters = answer.fit->parameters.size();
        for (std::size_t j = 0; j < parameters; ++j) {
            const ParameterEstimate& estimate = answer.fit->parameters[j];
            if (!estimate.low) {
                ++without;
                continue;
            }
            if (*estimate.low <= truth.parameters[j] && truth.parameters[j] <= *estimate.high)
                ++held[j];
        }
    }
    // An estimate without interval counts as one that misses.
    const double chance_deviation = std::sqrt(kChance * (1.0 - kChance) / kCases);
    const double room = std::max(0.02, 4.0 * chance_deviation);
    for (std::size_t j = 0; j < parameters; ++j) {
        const double share = static_cast<double>(held[j]) / kCases;
        std::cout << "recovery: " << field_law_key(law) << ", "
                  << (errors_add_up(kind) ? "interval" : "cumulative") << " errors, parameter "
                  << j + 1 << ": " << 100.0 * share << " %, " << without << " without interval\n";
        CHECK_THAT(share, WithinAbs(kChance, room));
    }
}

}  // namespace

TEST_CASE("recovery of Horton") {
    check_recovery(FieldLaw::horton, ReadingKind::infiltrated, 0.3);
    check_recovery(FieldLaw::horton, ReadingKind::drop, 0.3);
}

TEST_CASE("recovery of Green and Ampt") {
    check_recovery(FieldLaw::green_ampt, ReadingKind::infiltrated, 0.3);
    check_recovery(FieldLaw::green_ampt, ReadingKind::volume_added, 0.2);
}

TEST_CASE("recovery of Philip") {
    check_recovery(FieldLaw::philip, ReadingKind::infiltrated, 0.5);
    check_recovery(FieldLaw::philip, ReadingKind::drop, 0.3);
}

TEST_CASE("recovery of Kostiakov") {
    check_recovery(FieldLaw::kostiakov, ReadingKind::infiltrated, 0.5);
    check_recovery(FieldLaw::kostiakov, ReadingKind::volume_added, 0.3);
}

TEST_CASE("recovery of modified Kostiakov") {
    check_recovery(FieldLaw::modified_kostiakov, ReadingKind::infiltrated, 0.1);
    check_recovery(FieldLaw::modified_kostiakov, ReadingKind::drop, 0.05);
}

}  // namespace rainledger
