#include <vector>

#include "ledger/cases.hpp"
#include "test.hpp"

// Events solved by hand on small storms.
namespace rainledger {
namespace {

using testing::storm_of;

SurfaceLedger ledger_of(const Surface& surface, const Hyetograph& rain) {
    return keep_ledger(testing::site_of(surface), rain).surfaces.front();
}

Surface constant(double rate, double storage = 0.0, double interception = 0.0) {
    Surface out;
    out.name = "plot";
    out.losses = ConstantRate{rate, 0.0};
    out.depression_storage_mm = storage;
    out.interception_mm = interception;
    return out;
}

}  // namespace

TEST_CASE("a pond fills, runs over, drains and ends, each at its instant") {
    // 30 mm/h for half an hour on 10 mm/h: D grows 20 mm/h, full (4 mm) at 0.2 h, 6 mm run off,
    // then D falls 10 mm/h and is gone at 0.9 h.
    const SurfaceLedger ledger = ledger_of(constant(10.0, 4.0), storm_of(30.0, {15.0, 0.0, 0.0}));
    CHECK_THAT(ledger.total.excess_mm, WithinAbs(6.0, 1e-12));
    CHECK_THAT(ledger.total.infiltrated_mm, WithinAbs(9.0, 1e-12));
    CHECK_THAT(ledger.rows[0].accounts.ponded_mm, WithinAbs(4.0, 1e-12));
    CHECK(ledger.total.ponded_mm == 0.0);
    REQUIRE(ledger.runoff_start_h);
    CHECK_THAT(*ledger.runoff_start_h, WithinAbs(0.2, 1e-12));
    REQUIRE(ledger.ponding.size() == 1);
    CHECK(ledger.ponding[0].start_h == 0.0);
    CHECK_THAT(ledger.ponding[0].end_h.value(), WithinAbs(0.9, 1e-12));
    CHECK(ledger.closure_mm < 1e-13);
}

TEST_CASE("held water never drains and is not ponded once rain is weaker than capacity") {
    Surface surface = constant(10.0, 4.0);
    surface.ponded_water = PondedWater::held;
    const SurfaceLedger ledger = ledger_of(surface, storm_of(30.0, {15.0, 2.0, 0.0, 15.0}));
    CHECK_THAT(ledger.total.ponded_mm, WithinAbs(4.0, 1e-12));
    CHECK_THAT(ledger.total.infiltrated_mm, WithinAbs(5.0 + 2.0 + 0.0 + 5.0, 1e-12));
    CHECK_THAT(ledger.total.excess_mm, WithinAbs(6.0 + 10.0, 1e-12));  // it fills once
    REQUIRE(ledger.ponding.size() == 2);
    CHECK_THAT(ledger.ponding[0].end_h.value(), WithinAbs(0.5, 1e-12));
    CHECK_THAT(ledger.ponding[1].start_h, WithinAbs(1.5, 1e-12));
    CHECK_FALSE(ledger.ponding[1].end_h);
}

TEST_CASE("interception ends inside a step, and an initial loss after it") {
    // 12 mm/h: 1 mm intercepted in 5 min, 2 mm initial loss in 10 min, then 4 mm/h infiltrate.
    Surface surface = constant(4.0, 0.0, 1.0);
    surface.losses = ConstantRate{4.0, 2.0};
    const SurfaceLedger ledger = ledger_of(surface, storm_of(60.0, {12.0}));
    CHECK_THAT(ledger.total.initial_loss_mm, WithinAbs(3.0, 1e-12));
    CHECK_THAT(ledger.total.infiltrated_mm, WithinAbs(3.0, 1e-12));
    CHECK_THAT(ledger.total.excess_mm, WithinAbs(6.0, 1e-12));
    CHECK_THAT(ledger.runoff_start_h.value(), WithinAbs(0.25, 1e-12));
    CHECK_THAT(ledger.ponding.at(0).start_h, WithinAbs(0.25, 1e-12));
}

TEST_CASE("rain equal to a constant capacity never ponds, whatever the step's rounding") {
    // 0.625 mm in 5 min is 7.5 mm/h, but not to the last bit.
    const std::vector<double> rain(37, 0.625);
    for (const Losses& law : {Losses{ConstantRate{7.5, 0.0}}, Losses{Horton{{7.5, 7.5, 3.0}, 0.0}},
                              Losses{Horton{{90.0, 7.5, 3.0}, 0.0}}, Losses{GreenAmpt{7.5, 0.0}},
                              Losses{GreenAmpt{7.5, 60.0}}, Losses{Philip{20.0, 7.5}},
                              Losses{HortonElapsed{{90.0, 7.5, 3.0}}}}) {
        Surface surface = constant(0.0);
        surface.losses = law;
        const SurfaceLedger ledger = ledger_of(surface, storm_of(5.0, rain));
        INFO("law " << law.index());
        CHECK(ledger.ponding.empty());
        CHECK(ledger.total.excess_mm == 0.0);
        CHECK_FALSE(ledger.runoff_start_h);
    }
}

TEST_CASE("a store that fills exactly as the rain stops does not run over") {
    Surface surface = constant(0.0, 1.5);
    surface.losses = Impervious{};
    std::vector<double> rain(15, 0.1);  // fifteen tenths are not 1.5 to the last bit
    rain.push_back(0.0);
    const SurfaceLedger ledger = ledger_of(surface, storm_of(7.0, rain));
    CHECK(ledger.total.excess_mm == 0.0);
    CHECK_FALSE(ledger.runoff_start_h);
    CHECK_THAT(ledger.total.ponded_mm, WithinAbs(1.5, 1e-14));
}

TEST_CASE("an impervious surface reports no ponding, a soil without capacity does") {
    Surface surface = constant(0.0, 1.0);
    surface.losses = Impervious{};
    CHECK(ledger_of(surface, storm_of(5.0, {2.0, 0.0})).ponding.empty());
    surface.losses = GreenAmpt{0.0, 60.0};
    const SurfaceLedger ledger = ledger_of(surface, storm_of(5.0, {0.0, 2.0, 0.0}));
    REQUIRE(ledger.ponding.size() == 1);
    CHECK_THAT(ledger.ponding[0].start_h, WithinAbs(5.0 / 60.0, 1e-12));
    CHECK_FALSE(ledger.ponding[0].end_h);  // the held millimetre never drains
    CHECK_THAT(ledger.total.ponded_mm, WithinAbs(1.0, 1e-14));
    CHECK_THAT(ledger.total.excess_mm, WithinAbs(1.0, 1e-14));
}

TEST_CASE("ponding ends exactly at the step in which rain falls below capacity") {
    const SurfaceLedger ledger = ledger_of(constant(10.0), storm_of(10.0, {5.0, 1.0, 5.0}));
    REQUIRE(ledger.ponding.size() == 2);
    CHECK(ledger.ponding[0].end_h == 10.0 / 60.0);
    CHECK(ledger.ponding[1].start_h == 20.0 / 60.0);
}

TEST_CASE("a pond drains, turns and fills again within one step") {
    // A falling capacity that the rain overtakes before the pond is gone. The instant at which the
    // store is full again is checked by the balance at that instant: D + w t - F(t) = Dmax.
    Surface surface = constant(0.0, 8.0);
    const HortonCurve curve{60.0, 2.0, 3.0};
    surface.losses = Horton{curve, 0.0};
    // 61 mm/h for 0.3 h leave 6.2 mm; 20 mm/h is below capacity until te = ln(58/18)/3 = 0.39 h.
    const Hyetograph rain = make_hyetograph({0.0, 0.3, 1.8}, "h", {18.3, 30.0});
    const SurfaceLedger ledger = ledger_of(surface, rain);
    CHECK_THAT(ledger.rows[0].accounts.ponded_mm,
               WithinAbs(18.3 - horton_cumulative(curve, 0.3), 1e-12));
    REQUIRE(ledger.ponding.size() == 1);
    CHECK(ledger.ponding[0].start_h == 0.0);  // 61 mm/h exceeds f0: F is the curve itself
    CHECK_FALSE(ledger.ponding[0].end_h);
    REQUIRE(ledger.runoff_start_h);
    const double t = *ledger.runoff_start_h;
    CHECK(t > 0.39);
    CHECK_THAT(18.3 + 20.0 * (t - 0.3) - horton_cumulative(curve, t), WithinAbs(8.0, 1e-12));
}

TEST_CASE("a pond is gone and ponding starts again within one step") {
    Surface surface = constant(0.0, 3.0);
    const HortonCurve curve{40.0, 1.0, 2.0};
    surface.losses = Horton{curve, 0.0};
    // 0.1 h at 45 mm/h stores a little, which drains under 20 mm/h; 20 mm/h is overtaken later.
    const Hyetograph rain = make_hyetograph({0.0, 0.1, 1.6}, "h", {4.5, 30.0});
    const SurfaceLedger ledger = ledger_of(surface, rain);
    REQUIRE(ledger.ponding.size() == 2);
    const double gone = ledger.ponding[0].end_h.value();
    CHECK_THAT(4.5 + 20.0 * (gone - 0.1) - horton_cumulative(curve, gone), WithinAbs(0.0, 1e-12));
    const double te = horton_time_at_depth(curve, 4.5 + 20.0 * (ledger.ponding[1].start_h - 0.1));
    CHECK_THAT(horton_capacity(curve, te), WithinAbs(20.0, 1e-11));
    CHECK(ledger.ponding[1].start_h > gone);
}

TEST_CASE("reaching the storage limit ponds at once") {
    Surface surface = constant(0.0);
    GreenAmpt law{5.0, 100.0};
    law.storage_limit_mm = 12.0;
    surface.losses = law;
    const SurfaceLedger ledger = ledger_of(surface, storm_of(60.0, {20.0}));
    CHECK_THAT(ledger.total.infiltrated_mm, WithinAbs(12.0, 1e-12));
    CHECK_THAT(ledger.ponding.at(0).start_h, WithinAbs(0.6, 1e-12));
    CHECK_THAT(ledger.runoff_start_h.value(), WithinAbs(0.6, 1e-12));
    CHECK(ledger.rows[0].capacity_mm_per_h == 0.0);
}

TEST_CASE("Horton recovers in a dry gap and under rain that is being intercepted") {
    Surface surface = constant(0.0);
    const HortonCurve curve{50.0, 5.0, 4.0};
    surface.losses = Horton{curve, 0.5};
    const SurfaceLedger ledger = ledger_of(surface, storm_of(60.0, {60.0, 0.0, 60.0}));
    const double spent = horton_capacity(curve, 1.0);
    CHECK_THAT(ledger.rows[1].capacity_mm_per_h,
               WithinRel(50.0 - (50.0 - spent) * std::exp(-0.5), 1e-13));
    // Fresh soil has nothing to recover while interception fills.
    surface.interception_mm = 30.0;
    CHECK_THAT(ledger_of(surface, storm_of(60.0, {60.0})).total.infiltrated_mm,
               WithinAbs(horton_cumulative(curve, 0.5), 1e-12));
}

TEST_CASE("elapsed-time Horton runs through dry gaps and interception") {
    Surface surface = constant(0.0, 0.0, 6.0);
    const HortonCurve curve{50.0, 5.0, 4.0};
    surface.losses = HortonElapsed{curve};
    const SurfaceLedger ledger = ledger_of(surface, storm_of(15.0, {0.0, 12.0, 30.0}));
    // Intercepted until 15 + 7.5 min; 48 mm/h then exceeds the capacity of that instant.
    CHECK_THAT(ledger.ponding.at(0).start_h, WithinAbs(22.5 / 60.0, 1e-12));
    CHECK_THAT(ledger.total.infiltrated_mm,
               WithinAbs(horton_cumulative(curve, 0.75) - horton_cumulative(curve, 0.375), 1e-12));
}

TEST_CASE("a curve number abstracts, then runs off from the instant that rain passes Ia") {
    Surface surface = constant(0.0);
    surface.losses = CurveNumber{80.0};  // S 63.5, Ia 12.7 mm
    const SurfaceLedger ledger = ledger_of(surface, storm_of(60.0, {10.0, 27.0, 0.0}));
    CHECK_THAT(ledger.runoff_start_h.value(), WithinAbs(1.1, 1e-12));
    CHECK_THAT(ledger.total.initial_loss_mm, WithinAbs(12.7, 1e-12));
    CHECK_THAT(ledger.total.excess_mm, WithinAbs(24.3 * 24.3 / (24.3 + 63.5), 1e-12));
    CHECK(ledger.ponding.empty());
    CHECK(std::isnan(ledger.rows[0].capacity_mm_per_h));
    // Exactly Ia has not passed it.
    CHECK_FALSE(ledger_of(surface, storm_of(60.0, {10.0, 2.7})).runoff_start_h);
    surface.losses = CurveNumber{100.0};
    const SurfaceLedger all = ledger_of(surface, storm_of(60.0, {0.0, 3.0}));
    CHECK(all.total.excess_mm == 3.0);
    CHECK_THAT(all.runoff_start_h.value(), WithinAbs(1.0, 1e-15));
}

TEST_CASE("water still ponded at the end of the record is left there, unless dry time follows") {
    Hyetograph rain = storm_of(30.0, {15.0});
    const SurfaceLedger open = ledger_of(constant(10.0, 4.0), rain);
    CHECK_THAT(open.total.ponded_mm, WithinAbs(4.0, 1e-12));
    CHECK_FALSE(open.ponding.at(0).end_h);
    append_dry_time(rain, 1.2);
    const SurfaceLedger closed = ledger_of(constant(10.0, 4.0), rain);
    CHECK(closed.rows.size() == 4);
    CHECK(closed.total.ponded_mm == 0.0);
    CHECK_THAT(closed.ponding.at(0).end_h.value(), WithinAbs(0.9, 1e-12));
}

}  // namespace rainledger
