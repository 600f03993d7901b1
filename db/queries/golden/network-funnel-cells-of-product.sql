select branch_id as "branchId", package_id * 8 + age_band as key, count(*) as cars, sum(norm_ml) as e, sum(1.0 * normed_ml * normed_ml) as aa, sum(1.0 * normed_ml * norm_ml) as ae, sum(1.0 * norm_ml * norm_ml) as ee, sum(normed_ml) as part0
from (select * from job_facts where branch_id in (select id from branches) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as job_facts
where `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?)) and `norm_ml` > ?
group by 1, 2;

select job_facts.branch_id as "branchId", job_facts.package_id * 8 + job_facts.age_band as key, job_products.product_id as "productId", sum(job_products.ml) as ml
from (select * from job_facts where branch_id in (select id from branches) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as job_facts
inner join (select * from job_products where gen_from <= (select generation from network) and gen_to > (select generation from network)) as job_products on `job_products`.`branch_id` = `job_facts`.`branch_id` and `job_products`.`completed_on` = `job_facts`.`completed_on` and `job_products`.`job_id` = `job_facts`.`job_id`
inner join `norms` on `norms`.`package_id` = `job_facts`.`package_id` and `norms`.`body_type` = `job_facts`.`body_type` and `norms`.`product_id` = `job_products`.`product_id`
where `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?)) and `job_facts`.`norm_ml` > ?
group by 1, 2, 3;
