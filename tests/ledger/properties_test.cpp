#include <algorithm>
#include <cstddef>
#include <utility>

#include "ledger/cases.hpp"
#include "test.hpp"

// What must hold for every storm and surface, over random cases with a fixed seed.
namespace rainledger {
namespace {

using testing::Cases;

constexpr unsigned kSeed = 20260305;
#ifdef RAINLEDGER_FEW_CASES
constexpr int kCases = 60;
#else
constexpr int kCases = 600;
#endif

SurfaceLedger ledger_of(const Surface& surface, const Hyetograph& rain) {
    return keep_ledger({{surface}}, rain).surfaces.front();
}

/// Runs `check(case number, cases)` over the random cases.
template <class Check>
void over_cases(unsigned salt, const Check& check) {
    Cases cases(kSeed + salt);
    for (int i = 0; i < kCases; ++i) {
        INFO("seed " << kSeed + salt << " case " << i);
        check(cases);
    }
}

Hyetograph scaled(Hyetograph rain, double factor) {
    multiply_depths(rain, factor);
    return rain;
}

}  // namespace

TEST_CASE("the books close on every step and in total, and every account stays in its bounds") {
    over_cases(0, [](Cases& cases) {
        const Hyetograph rain = cases.storm();
        const Surface surface = cases.surface();
        const SurfaceLedger ledger = ledger_of(surface, rain);
        const double room = 1e-9 * std::max(1.0, ledger.total.rain_mm);
        CHECK(ledger.closure_mm <= room);
        double stored = 0.0;
        double excess = 0.0;
        for (const LedgerRow& row : ledger.rows) {
            const Accounts& step = row.accounts;
            CHECK(step.infiltrated_mm >= 0.0);
            CHECK(step.infiltrated_mm <= step.rain_mm + stored + room);
            CHECK(step.excess_mm >= 0.0);
            CHECK(step.initial_loss_mm >= 0.0);
            CHECK(step.ponded_mm >= 0.0);
            CHECK(step.ponded_mm <= surface.depression_storage_mm * (1.0 + 1e-12));
            stored = step.ponded_mm;
            excess += step.excess_mm;
        }
        CHECK(ledger.runoff_start_h.has_value() == (excess > 0.0));
        for (std::size_t i = 0; i < ledger.ponding.size(); ++i) {
            if (i > 0) CHECK(ledger.ponding[i].start_h > ledger.ponding[i - 1].end_h.value());
            if (ledger.ponding[i].end_h)
                CHECK(*ledger.ponding[i].end_h > ledger.ponding[i].start_h);
        }
        CHECK_THAT(march_totals(surface, rain).excess_mm, WithinAbs(ledger.total.excess_mm, room));
    });
}

TEST_CASE("cutting steps changes no total and no instant by more than rounding") {
    over_cases(1, [](Cases& cases) {
        const Hyetograph rain = cases.storm();
        const Surface surface = cases.surface();
        std::vector<double> cuts;
        double at = rain.edges_h.front();
        while (at < rain.edges_h.back())
            cuts.push_back(at += cases.between(0.01, 0.4));
        const SurfaceLedger whole = ledger_of(surface, rain);
        const SurfaceLedger cut = ledger_of(surface, cut_hyetograph(rain, cuts).rain);
        CHECK_THAT(cut.total.infiltrated_mm, WithinAbs(whole.total.infiltrated_mm, 1e-10));
        CHECK_THAT(cut.total.excess_mm, WithinAbs(whole.total.excess_mm, 1e-10));
        CHECK_THAT(cut.total.ponded_mm, WithinAbs(whole.total.ponded_mm, 1e-10));
        REQUIRE(cut.ponding.size() == whole.ponding.size());
        for (std::size_t i = 0; i < cut.ponding.size(); ++i)
            CHECK_THAT(cut.ponding[i].start_h, WithinAbs(whole.ponding[i].start_h, 1e-8));
        CHECK(cut.runoff_start_h.has_value() == whole.runoff_start_h.has_value());
        if (cut.runoff_start_h)
            CHECK_THAT(*cut.runoff_start_h, WithinAbs(*whole.runoff_start_h, 1e-8));
    });
}

TEST_CASE("more rain never gives less excess") {
    over_cases(2, [](Cases& cases) {
        const Hyetograph rain = cases.storm();
        const Surface surface = cases.surface();
        const double less = ledger_of(surface, rain).total.excess_mm;
        CHECK(ledger_of(surface, scaled(rain, cases.between(1.0, 1.5))).total.excess_mm >=
              less - 1e-10);
        Hyetograph burst = rain;
        const auto step =
            static_cast<std::size_t>(cases.between(0.0, static_cast<double>(rain.steps()) - 0.01));
        burst.depth_mm[step] += cases.between(0.0, 5.0);
        CHECK(ledger_of(surface, burst).total.excess_mm >= less - 1e-10);
    });
}

TEST_CASE("a higher capacity never gives more excess") {
    over_cases(3, [](Cases& cases) {
        const Hyetograph rain = cases.storm();
        Surface surface = cases.infiltrating_surface();
        const double more = cases.between(1.0, 2.0);
        const double before = ledger_of(surface, rain).total.excess_mm;
        if (auto* horton = std::get_if<Horton>(&surface.losses)) {
            horton->curve.initial_capacity_mm_per_h *= more;
        } else if (auto* elapsed = std::get_if<HortonElapsed>(&surface.losses)) {
            elapsed->curve.decay_per_h /= more;
        } else if (auto* green_ampt = std::get_if<GreenAmpt>(&surface.losses)) {
            green_ampt->conductivity_mm_per_h *= more;
        } else if (auto* philip = std::get_if<Philip>(&surface.losses)) {
            philip->sorptivity_mm_per_sqrt_h *= more;
        } else if (auto* constant = std::get_if<ConstantRate>(&surface.losses)) {
            constant->rate_mm_per_h *= more;
        }
        CHECK(ledger_of(surface, rain).total.excess_mm <= before + 1e-10);
    });
}

TEST_CASE("a surface cut in two equal halves is the same site") {
    over_cases(4, [](Cases& cases) {
        const Hyetograph rain = cases.storm();
        const Surface surface = cases.surface();
        Surface half = surface;
        half.area_m2 *= 0.5;
        Surface other = half;
        other.name = "other half";
        const PlaceLedger whole = keep_ledger({{surface}}, rain).site;
        const PlaceLedger halves = keep_ledger({{half, other}}, rain).site;
        CHECK_THAT(halves.total.excess_mm, WithinAbs(whole.total.excess_mm, 1e-12));
        CHECK_THAT(halves.figures.excess_volume_m3,
                   WithinRel(whole.figures.excess_volume_m3, 1e-13));
        CHECK_THAT(halves.figures.worst_flow_l_per_s[1],
                   WithinRel(whole.figures.worst_flow_l_per_s[1], 1e-12));
    });
}

TEST_CASE("millimetres turned into inches and back give the same ledger") {
    over_cases(5, [](Cases& cases) {
        Hyetograph rain = cases.storm();
        const Surface surface = cases.surface();
        const double direct = ledger_of(surface, rain).total.excess_mm;
        const Unit inch = find_unit("in", Dimension::depth).value();
        for (double& depth : rain.depth_mm)
            depth = inch.to_canonical(inch.from_canonical(depth));
        CHECK_THAT(ledger_of(surface, rain).total.excess_mm, WithinAbs(direct, 1e-11));
    });
}

TEST_CASE("no rain, no excess; a dry start and a dry end change nothing without a clock") {
    over_cases(6, [](Cases& cases) {
        const Hyetograph rain = cases.storm();
        const Surface surface = cases.infiltrating_surface();
        CHECK(ledger_of(surface, scaled(rain, 0.0)).total.excess_mm == 0.0);
        if (std::holds_alternative<HortonElapsed>(surface.losses)) return;
        std::vector<double> edges{-2.0};
        std::vector<double> depths{0.0};
        edges.insert(edges.end(), rain.edges_h.begin(), rain.edges_h.end());
        depths.insert(depths.end(), rain.depth_mm.begin(), rain.depth_mm.end());
        const Hyetograph later = make_hyetograph(std::move(edges), "h", std::move(depths));
        CHECK_THAT(ledger_of(surface, later).total.excess_mm,
                   WithinAbs(ledger_of(surface, rain).total.excess_mm, 1e-10));
    });
}

TEST_CASE("a hundred thousand steps close as well as ten") {
    std::vector<double> depths;
    for (int i = 0; i < 100000; ++i)
        depths.push_back(i % 97 < 31 ? 0.01 * (i % 31) : 0.0);
    const Hyetograph rain = testing::storm_of(1.0, std::move(depths));
    for (const Losses& law :
         {Losses{Horton{{50.0, 6.0, 4.14}, 0.02}}, Losses{GreenAmpt{10.9, 22.0}},
          Losses{Philip{12.0, 4.0}}, Losses{ConstantRate{7.5, 10.0}}, Losses{CurveNumber{75.0}}}) {
        Surface surface;
        surface.name = "plot";
        surface.area_m2 = 100.0;
        surface.losses = law;
        if (!std::holds_alternative<CurveNumber>(law)) surface.depression_storage_mm = 3.0;
        const SurfaceLedger ledger = ledger_of(surface, rain);
        INFO("law " << law.index());
        CHECK(ledger.closure_mm <= 1e-11 * ledger.total.rain_mm);
    }
}

}  // namespace rainledger
