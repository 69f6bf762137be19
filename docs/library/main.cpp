// A verge of sandy loam beside a parking lot, under a storm of forty minutes: how much runs off,
// when it begins, and the textbook ponding time beside it.
#include <cstdio>

#include <rainledger/ledger/ledger.hpp>

int main() {
    using namespace rainledger;

    // Depths in mm for four steps of ten minutes.
    const Hyetograph rain = make_hyetograph({0, 10, 20, 30, 40}, "min", {4.0, 9.0, 12.0, 3.0});

    Surface parking;
    parking.name = "parking";
    parking.area_m2 = 480.0;
    parking.depression_storage_mm = 1.5;
    parking.losses = Impervious{};
    parking.runs_onto = {{1, 0.3}};  // 30 % of its excess runs onto surface 1, the verge

    Surface verge;
    verge.name = "verge";
    verge.area_m2 = 160.0;
    verge.depression_storage_mm = 4.0;
    verge.losses = GreenAmpt{10.9, 110.0 * 0.20};  // K in mm/h, suction times deficit in mm

    const SiteLedger ledger = keep_ledger({{parking, verge}}, rain);
    const SurfaceLedger& account = ledger.surfaces[1];
    std::printf("verge: rain %.2f mm, run-on %.2f mm, infiltrated %.2f mm, excess %.2f mm\n",
                account.total.rain_mm, account.total.run_on_mm, account.total.infiltrated_mm,
                account.total.excess_mm);
    for (const PondedInterval& interval : account.ponding) {
        std::printf("ponded from %.2f min", interval.start_h * 60.0);
        if (interval.end_h) std::printf(" to %.2f min", *interval.end_h * 60.0);
        std::printf("\n");
    }
    std::printf("under a steady 50 mm/h it would pond after %.2f min\n",
                green_ampt_ponding_time(10.9, 22.0, 50.0) * 60.0);
    const bool closes = ledger.site.closure_mm <= 1e-9 * total_depth_mm(rain);
    std::printf("site: excess %.3f m3; the books %s\n", ledger.site.figures.excess_volume_m3,
                closes ? "balance" : "do not balance");
    return closes ? 0 : 1;
}
