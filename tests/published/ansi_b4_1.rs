//! Inch fits of ANSI B4.1 through the whole tool: hole and shaft limits as a spec writes them give
//! the clearances that the tables print. The rows and their sources stand in `ansi_b4_1.csv`.

use crate::support::run;
use gapkeep::model::Quantity;

/// Thousandths of an inch as a deviation in inches, signed.
fn deviation(thousandths: &str) -> String {
    let value: f64 = thousandths.trim().parse().unwrap();
    format!("{:+.5}", value / 1000.0)
}

#[test]
fn limits_of_hole_and_shaft_give_the_printed_clearances() {
    let table = include_str!("ansi_b4_1.csv");
    let mut lines = table.lines().filter(|l| !l.starts_with('#') && !l.trim().is_empty());
    let header: Vec<&str> = lines.next().unwrap().split(',').map(str::trim).collect();
    let column = |name: &str| {
        header.iter().position(|h| *h == name).unwrap_or_else(|| panic!("{name} in {header:?}"))
    };
    let mut rows = 0;
    for line in lines {
        let cells: Vec<&str> = line.split(',').collect();
        let cell = |name: &str| cells[column(name)];
        let (low, high): (f64, f64) =
            (cell("over").trim().parse().unwrap(), cell("to").trim().parse().unwrap());
        let size = 0.5 * (low + high);
        let text = format!(
            "assembly \"B4.1\"\nlengths in inch\ntemperatures in degF\nreference 68 degF\n\
             condition shop 68\n\
             part bush of steel_c45 {{ bore = dia {size:.4} {}/{} }}\n\
             part pin of steel_c45 {{ outside = dia {size:.4} {}/{} }}\n\
             fit f = pin.outside in bush.bore\n",
            deviation(cell("hole_upper")),
            deviation(cell("hole_lower")),
            deviation(cell("shaft_upper")),
            deviation(cell("shaft_lower")),
        );
        let (least, greatest) = run(&text).range("f", Quantity::Clearance, "shop");
        let printed = |name: &str| cell(name).trim().parse::<f64>().unwrap() / 1000.0;
        let expected = (printed("least_clearance"), printed("greatest_clearance"));
        assert!(
            (least - expected.0).abs() < 1e-9 && (greatest - expected.1).abs() < 1e-9,
            "{line}: {least} {greatest}"
        );
        rows += 1;
    }
    assert!(rows > 45, "{rows}");
}
